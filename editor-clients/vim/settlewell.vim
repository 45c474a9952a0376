" Settlewell for Vim with ALE (the Asynchronous Lint Engine).
"
" Put this file into ~/.vim/plugin/ and `settlewell` on the PATH. To start it otherwise:
"   let g:settlewell_command = '/opt/settlewell/bin/settlewell'

let g:settlewell_command = get(g:, 'settlewell_command', 'settlewell')

augroup settlewell
  autocmd!
  autocmd BufNewFile,BufRead *.channels.yaml setlocal filetype=yaml.channels
augroup END

function! s:Root(buffer) abort
  let l:folder = expand('#' . a:buffer . ':p:h')
  for l:mark in ['.settlewell.yaml', '.git']
    let l:found = ale#path#FindNearestDirectory(a:buffer, l:mark)
    if !empty(l:found)
      return fnamemodify(l:found, ':h:h')
    endif
    let l:file = ale#path#FindNearestFile(a:buffer, l:mark)
    if !empty(l:file)
      return fnamemodify(l:file, ':h')
    endif
  endfor
  return l:folder
endfunction

function! s:Define() abort
  call ale#linter#Define('channels', {
  \ 'name': 'settlewell',
  \ 'lsp': 'stdio',
  \ 'executable': {b -> g:settlewell_command},
  \ 'command': '%e serve',
  \ 'project_root': function('s:Root'),
  \ 'language': 'yaml',
  \})
endfunction

autocmd VimEnter * call s:Define()
