-- Drives Neovim's client against a real server: findings, hover, completion, an applied fix.
-- Run by test.sh. Waits for what is to happen, never for a time.

local function fail(message)
  io.stderr:write('FAILED: ' .. message .. '\n')
  vim.cmd('cquit 1')
end

local function await(what, condition)
  if not vim.wait(60000, condition, 20) then
    fail(what .. ' never came')
  end
end

local sheet = vim.env.SETTLEWELL_TEST_SHEET
dofile(vim.env.SETTLEWELL_CLIENT)
vim.cmd('edit ' .. sheet)
local buffer = vim.api.nvim_get_current_buf()

local function findings()
  return vim.diagnostic.get(buffer)
end

local function line_of(text)
  for number, line in ipairs(vim.api.nvim_buf_get_lines(buffer, 0, -1, false)) do
    local column = line:find(text, 1, true)
    if column then
      return number - 1, column - 1
    end
  end
  fail('no line with ' .. text)
end

local function request(method, extra, text, offset)
  local line, column = line_of(text)
  local params = vim.tbl_extend('force', {
    textDocument = { uri = vim.uri_from_bufnr(buffer) },
    position = { line = line, character = column + (offset or 0) },
  }, extra or {})
  local answers = vim.lsp.buf_request_sync(buffer, method, params, 60000)
  for _, answer in pairs(answers or {}) do
    if answer.error then
      fail(method .. ': ' .. vim.inspect(answer.error))
    end
    return answer.result
  end
  fail(method .. ' was not answered')
end

-- Findings
await('the finding', function()
  return #findings() > 0
end)
local found = findings()[1]
if found.code ~= 'acquisition-not-offered' and not found.message:find('offered', 1, true) then
  fail('another finding: ' .. vim.inspect(found))
end

-- Hover
local hover = request('textDocument/hover', nil, 'needs:')
if not hover.contents.value:find('error at 95', 1, true) then
  fail('hover says ' .. vim.inspect(hover))
end

-- Completion
local items = request('textDocument/completion', nil, 'voltage:', 2)
local labels = {}
for _, item in ipairs(items.items) do
  labels[item.label] = true
end
if not labels.thermistor then
  fail('completion lacks thermistor')
end

-- A fix, applied as Neovim applies it
local line = line_of('acquisition: 13')
local range = {
  start = { line = line, character = 18 },
  ['end'] = { line = line, character = 18 },
}
local actions =
  request('textDocument/codeAction', { range = range, context = { diagnostics = {} } }, 'acquisition: 13')
local fix
for _, action in ipairs(actions) do
  if action.kind == 'quickfix' and not action.title:find('Accept', 1, true) then
    fix = fix or action
  end
end
if not fix then
  fail('no fix among ' .. vim.inspect(actions))
end
local client = vim.lsp.get_client_by_id(next(vim.lsp.buf_get_clients(buffer)))
vim.lsp.util.apply_workspace_edit(fix.edit, client.offset_encoding)
await('the end of the finding', function()
  return #findings() == 0
end)

io.stdout:write('passed: findings, hover, completion, fix\n')
vim.cmd('qall!')
