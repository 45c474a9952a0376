" Checks channel sheets with ALE 3.2 or later; Vim 8.1 or later.

" The command that starts the server.
let g:settlewell_command = get(g:, 'settlewell_command', 'settlewell serve')

" The nearest folder above with `.git` or the project file, else the sheet's own: as the server does.
" Nothing for other YAML, which keeps the server away from it.
function! s:Root(buffer) abort
  let l:path = fnamemodify(bufname(a:buffer), ':p')
  if l:path !~# '\.channels\.yaml$'
    return ''
  endif
  let l:own = fnamemodify(l:path, ':h')
  let l:folder = l:own
  while 1
    if !empty(getftype(l:folder . '/.git')) || filereadable(l:folder . '/.settlewell.yaml')
      return l:folder
    endif
    let l:above = fnamemodify(l:folder, ':h')
    if l:above ==# l:folder
      return l:own
    endif
    let l:folder = l:above
  endwhile
endfunction

" ALE takes columns for bytes in everything it sends and receives, where the protocol counts UTF-16
" units unless told otherwise: without this option marks and fixes behind a Ω or ± would be misplaced.
call ale#linter#Define('yaml', {
\   'name': 'settlewell',
\   'lsp': 'stdio',
\   'executable': {_ -> split(g:settlewell_command)[0]},
\   'command': {_ -> g:settlewell_command},
\   'project_root': function('s:Root'),
\   'initialization_options': {'positionEncoding': 'utf-8'},
\})

function! s:Sheet() abort
  let b:ale_linters = ['settlewell']
  setlocal omnifunc=ale#completion#OmniFunc
  nmap <buffer> K <Plug>(ale_hover)
  nmap <buffer> gd <Plug>(ale_go_to_definition)
  nmap <buffer> gra <Plug>(ale_code_action)
  nmap <buffer> grn <Plug>(ale_rename)
  nmap <buffer> grr <Plug>(ale_find_references)
  nmap <buffer> ]d <Plug>(ale_next)
  nmap <buffer> [d <Plug>(ale_previous)
endfunction

augroup settlewell
  autocmd!
  autocmd BufNewFile,BufRead *.channels.yaml call s:Sheet()
augroup END
