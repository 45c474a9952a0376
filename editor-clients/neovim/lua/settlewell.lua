-- Starts Settlewell for channel sheets with Neovim's own client; Neovim 0.7 or later, no plugin.
local M = {}

local defaults = {
  -- The command that starts the server. On Windows: { "settlewell.cmd", "serve" }.
  cmd = { "settlewell", "serve" },
  -- What the server's settings are called stands in the README.
  settings = vim.empty_dict(),
  -- Keys of the buffer; give false to set none.
  keys = true,
}

local running = {} -- client of each root, where Neovim does not keep them itself

-- The nearest folder above with `.git` or the project file, else the sheet's own: as the server does.
local function root_of(path)
  local own = vim.fn.fnamemodify(path, ":p:h")
  local folder = own
  while true do
    if vim.loop.fs_stat(folder .. "/.git") or vim.loop.fs_stat(folder .. "/.settlewell.yaml") then
      return folder
    end
    local above = vim.fn.fnamemodify(folder, ":h")
    if above == folder then
      return own
    end
    folder = above
  end
end

local function set_keys(buffer)
  local function map(keys, action, what)
    vim.keymap.set("n", keys, action, { buffer = buffer, desc = what })
  end
  map("K", vim.lsp.buf.hover, "What the value under the cursor means")
  map("gra", vim.lsp.buf.code_action, "Quick fixes")
  map("grn", vim.lsp.buf.rename, "Rename everywhere")
  map("grr", vim.lsp.buf.references, "Where it is used")
  map("[d", vim.diagnostic.goto_prev, "Previous finding")
  map("]d", vim.diagnostic.goto_next, "Next finding")
end

local function attached(options)
  return function(_, buffer)
    vim.bo[buffer].omnifunc = "v:lua.vim.lsp.omnifunc"
    vim.bo[buffer].tagfunc = "v:lua.vim.lsp.tagfunc"
    if options.keys then
      set_keys(buffer)
    end
  end
end

-- Neovim 0.8 and later keep one client a root themselves.
local function start(config, buffer)
  if vim.lsp.start then
    vim.lsp.start(config, { bufnr = buffer })
    return
  end
  local id = running[config.root_dir]
  if not id or not vim.lsp.get_client_by_id(id) then
    id = vim.lsp.start_client(config)
    running[config.root_dir] = id
  end
  if id then
    vim.lsp.buf_attach_client(buffer, id)
  end
end

local function attach(options, buffer)
  local root = root_of(vim.api.nvim_buf_get_name(buffer))
  start({
    name = "settlewell",
    cmd = options.cmd,
    root_dir = root,
    workspace_folders = { { uri = vim.uri_from_fname(root), name = root } },
    -- Sent twice: at once, and as the section that later changes go to.
    init_options = options.settings,
    settings = { settlewell = options.settings },
    on_attach = attached(options),
  }, buffer)
end

--- Checks every channel sheet that is opened from now on.
function M.setup(options)
  options = vim.tbl_extend("force", defaults, options or {})
  local group = vim.api.nvim_create_augroup("settlewell", { clear = true })
  vim.api.nvim_create_autocmd({ "BufReadPost", "BufNewFile" }, {
    group = group,
    pattern = "*.channels.yaml",
    callback = function(event)
      attach(options, event.buf)
    end,
  })
end

return M
