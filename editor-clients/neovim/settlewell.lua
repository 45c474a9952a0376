-- Settlewell for Neovim's own language client, 0.7 and newer. No plugin is needed.
--
-- Put this file into ~/.config/nvim/plugin/ and `settlewell` on the PATH. To set something,
-- define vim.g.settlewell before, in init.lua:
--   vim.g.settlewell = { cmd = { '/opt/settlewell/bin/settlewell', 'serve' } }

local settings = vim.g.settlewell or {}
local command = settings.cmd or { 'settlewell', 'serve' }
local clients = {} -- by folder, where Neovim does not keep them itself

-- The folder that holds the workspace: the nearest with .git or the project file above the sheet.
local function root(file)
  local folder = vim.fn.fnamemodify(file, ':p:h')
  local here = folder
  while true do
    for _, mark in ipairs({ '/.settlewell.yaml', '/.git' }) do
      if vim.fn.empty(vim.fn.glob(here .. mark)) == 0 then
        return here
      end
    end
    local above = vim.fn.fnamemodify(here, ':h')
    if above == here then
      return folder
    end
    here = above
  end
end

local function start(buffer)
  local folder = root(vim.api.nvim_buf_get_name(buffer))
  local config = {
    name = 'settlewell',
    cmd = command,
    root_dir = folder,
    workspace_folders = { { uri = vim.uri_from_fname(folder), name = folder } },
    init_options = settings.options or vim.empty_dict(),
  }
  if vim.lsp.start then
    vim.lsp.start(config, { bufnr = buffer })
    return
  end
  local client = clients[folder]
  if not client or not vim.lsp.get_client_by_id(client) then
    client = vim.lsp.start_client(config)
    clients[folder] = client
  end
  if client then
    vim.lsp.buf_attach_client(buffer, client)
  end
end

vim.api.nvim_create_autocmd({ 'BufReadPost', 'BufNewFile' }, {
  pattern = '*.channels.yaml',
  callback = function(event)
    start(event.buf)
  end,
})
