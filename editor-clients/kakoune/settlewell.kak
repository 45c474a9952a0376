# Settlewell for Kakoune with kakoune-lsp: source this file from kakrc after kakoune-lsp itself,
# and put `settlewell` on the PATH.

hook global BufCreate .*[.]channels[.]yaml %{
    set-option buffer filetype yaml
    set-option buffer lsp_servers %{
        [settlewell]
        root_globs = [".settlewell.yaml", ".git"]
        command = "settlewell"
        args = ["serve"]
    }
    lsp-enable-window
}
