-- Run by test.sh inside a headless Neovim. Every wait is for a state; a failure ends with exit code 1.
local patience = tonumber(vim.env.SETTLEWELL_WAIT) * 1000

local function check(ok, what)
  if not ok then
    io.stderr:write("failed: ", what, "\n")
    vim.cmd("cquit 1")
  end
end

local function wait(what, condition)
  check(vim.wait(patience, condition, 20), "waited in vain for " .. what)
end

local function finding(name)
  for _, found in ipairs(vim.diagnostic.get(0)) do
    local code = found.code or (found.user_data and found.user_data.lsp.code)
    if code == name then
      return found
    end
  end
end

-- Line from 1 and column from 1, in bytes, where `text` first stands.
local function place(text)
  for number, line in ipairs(vim.api.nvim_buf_get_lines(0, 0, -1, true)) do
    local column = line:find(text, 1, true)
    if column then
      return number, column
    end
  end
  check(false, "no " .. text .. " in the sheet")
end

local function go(text)
  local line, column = place(text)
  vim.api.nvim_win_set_cursor(0, { line, column - 1 })
end

local function stands_at(found, text)
  local line, column = place(text)
  check(
    found.lnum == line - 1 and found.col == column - 1,
    string.format("%s marked at %d:%d", text, found.lnum + 1, found.col + 1)
  )
end

local function float()
  for _, window in ipairs(vim.api.nvim_list_wins()) do
    if vim.api.nvim_win_get_config(window).relative ~= "" then
      local lines = vim.api.nvim_buf_get_lines(vim.api.nvim_win_get_buf(window), 0, -1, true)
      return table.concat(lines, "\n"), window
    end
  end
end

local function keys(text)
  return vim.api.nvim_replace_termcodes(text, true, false, true)
end

-- The quick fix that a person picks from the menu.
local function fix(text, title)
  go(text)
  local offered = {}
  vim.ui.select = function(items, options, chosen)
    for _, item in ipairs(items) do
      local words = options.format_item(item)
      table.insert(offered, words)
      if words:find(title, 1, true) then
        return chosen(item)
      end
    end
    check(false, title .. " is not among the fixes: " .. table.concat(offered, "; "))
  end
  vim.lsp.buf.code_action()
end

-- A key of a channel, half typed and completed as a person does, with Ctrl-X Ctrl-O. The timer runs
-- while the editor sits in insert mode; it ends that mode once the menu is there.
local function complete(words)
  local menu
  local deadline = vim.loop.now() + patience
  local timer = vim.loop.new_timer()
  timer:start(20, 20, vim.schedule_wrap(function()
    local items = vim.fn.complete_info({ "items" }).items
    if not menu and (#items > 0 or vim.loop.now() > deadline) then
      menu = items
      timer:stop()
      vim.api.nvim_feedkeys(keys("<C-y><Esc>"), "n", false)
    end
  end))
  vim.api.nvim_feedkeys(keys("o<C-u>" .. words .. "<C-x><C-o>"), "nx!", false)
  return menu
end

local function run()
  vim.opt.runtimepath:append(vim.env.CLIENT)
  require("settlewell").setup({ cmd = { vim.env.SETTLEWELL, "serve" } })
  vim.cmd("edit " .. vim.env.SHEET)

  wait("findings", function()
    return finding("unknown-name") and finding("acquisition-too-short")
  end)
  stands_at(finding("unknown-name"), "reff")
  stands_at(finding("acquisition-too-short"), "8 cycles")
  check(#vim.diagnostic.get(0) == 2, "two findings, not " .. #vim.diagnostic.get(0))

  go("8 cycles")
  vim.api.nvim_feedkeys("K", "x", false)
  wait("the hover", float)
  local text, window = float()
  check(text:find("acquisition", 1, true) and text:find("µs", 1, true), "hover says: " .. text)
  vim.api.nvim_win_close(window, true)

  vim.opt.completeopt = { "menuone" }
  go("interferers: []")
  local menu = complete("    resol")
  check(menu and #menu > 0, "no completion")
  check(menu[1].word:find("resolution", 1, true), "completion offers " .. menu[1].word)
  local line = vim.api.nvim_get_current_line()
  check(line:find("^    resolution:"), "completion wrote: " .. line)
  vim.cmd("normal! u")
  check(vim.fn.search("resol", "nw") == 0, "undo left the completion behind")

  fix("8 cycles", "16 cycles")
  wait("the acquisition to be mended", function()
    return vim.fn.search("16 cycles", "nw") > 0 and not finding("acquisition-too-short")
  end)
  fix("reff", "`ref`")
  wait("the name to be mended", function()
    return vim.fn.search("reff", "nw") == 0 and #vim.diagnostic.get(0) == 0
  end)
  vim.cmd("write")

  local client = vim.lsp.get_active_clients()[1]
  client.stop()
  wait("the server's end", function()
    return client.is_stopped()
  end)
  vim.cmd("qall!")
end

local ok, fault = xpcall(run, debug.traceback)
check(ok, fault)
