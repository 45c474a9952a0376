" Run by test.sh in Vim. Every wait is for a state; a failure ends with exit code 1.
set nocompatible nomore encoding=utf-8
let s:patience = str2nr($SETTLEWELL_WAIT) * 1000

function! s:Check(ok, what) abort
  if !a:ok
    call writefile(['failed: ' . a:what], $LOG, 'a')
    cquit 1
  endif
endfunction

" Lets the server answer until the expression holds. Vim tells ALE of changes when it waits for a
" key, which it does not do inside a script: told here instead.
function! s:Wait(what, condition) abort
  let l:waited = 0
  let l:tick = b:changedtick
  while !eval(a:condition) && l:waited < s:patience
    sleep 20m
    let l:waited += 20
    if b:changedtick != l:tick
      let l:tick = b:changedtick
      doautocmd <nomodeline> TextChanged
    endif
  endwhile
  call s:Check(eval(a:condition), 'waited in vain for ' . a:what)
endfunction

function! Findings() abort
  return get(get(g:ale_buffer_info, bufnr(''), {}), 'loclist', [])
endfunction

function! Finding(name) abort
  return get(filter(copy(Findings()), 'get(v:val, "code", "") ==# a:name'), 0, {})
endfunction

function! Says(text) abort
  return search('\V' . a:text, 'nw') > 0
endfunction

function! s:Go(text) abort
  call cursor(1, 1)
  call s:Check(search('\V' . a:text, 'cW') > 0, 'no ' . a:text . ' in the sheet')
endfunction

function! s:StandsAt(found, text) abort
  call s:Go(a:text)
  let l:at = getpos('.')[1:2]
  call s:Check([a:found.lnum, a:found.col] == l:at,
  \   a:text . ' marked at ' . a:found.lnum . ':' . a:found.col)
endfunction

function! s:Preview() abort
  for l:window in range(1, winnr('$'))
    if getwinvar(l:window, '&previewwindow')
      return join(getbufline(winbufnr(l:window), 1, '$'), "\n")
    endif
  endfor
  return ''
endfunction

function! HoverSays() abort
  return s:Preview() =~# 'acquisition' && s:Preview() =~# 'µs'
endfunction

" The quick fix that a person picks from ALE's list, by its number.
function! s:Fix(text, title) abort
  call s:Go(a:text)
  let s:title = a:title
  ALECodeAction
endfunction

function! s:Pick(message, ...) abort
  for l:line in split(a:message, "\n")
    if l:line =~# '\V' . s:title
      return matchstr(l:line, '^\d\+')
    endif
  endfor
  call s:Check(0, s:title . ' is not among the fixes: ' . a:message)
endfunction

" In insert mode, until the menu is there.
function! s:Menu(timer) abort
  let s:menu = complete_info(['items']).items
  let s:waited += 20
  if !empty(s:menu) || s:waited > s:patience
    call timer_stop(a:timer)
    call feedkeys("\<C-y>\<Esc>", 'n')
  endif
endfunction

function! s:Run() abort
  let g:ale_virtualtext_cursor = 0
  filetype plugin indent on
  let g:settlewell_command = $SETTLEWELL . ' serve'
  execute 'source' fnameescape($CLIENT . '/settlewell.vim')
  runtime plugin/ale.vim
  execute 'edit' fnameescape($SHEET)
  doautocmd VimEnter

  call s:Wait('findings', '!empty(Finding("unknown-name")) && !empty(Finding("acquisition-too-short"))')
  call s:Check(len(Findings()) == 2, 'two findings, not ' . len(Findings()))
  call s:StandsAt(Finding('unknown-name'), 'reff')
  call s:StandsAt(Finding('acquisition-too-short'), '8 cycles')

  call s:Go('8 cycles')
  normal K
  call s:Wait('the hover', 'HoverSays()')
  pclose

  " A key of a channel, half typed and completed as a person does, with Ctrl-X Ctrl-O.
  set completeopt=menuone
  call s:Go('interferers: []')
  let s:waited = 0
  call timer_start(20, function('s:Menu'), {'repeat': -1})
  call feedkeys("o\<C-u>    resol\<C-x>\<C-o>", 'x!')
  call s:Check(!empty(s:menu), 'no completion')
  call s:Check(getline('.') =~# '^    resolution:', 'completion wrote: ' . getline('.'))
  undo
  call s:Check(!Says('resol'), 'undo left the completion behind')

  call s:Fix('8 cycles', '16 cycles')
  call s:Wait('the acquisition to be mended', 'Says("16 cycles") && empty(Finding("acquisition-too-short"))')
  call s:Fix('reff', '`ref`')
  call s:Wait('the name to be mended', '!Says("reff") && empty(Findings())')
  write
endfunction

try
  packadd! ale
  runtime autoload/ale/util.vim
  " Loaded first, so that nothing loads it over this answer to its question.
  function! ale#util#Input(message, ...) abort
    return s:Pick(a:message)
  endfunction
  call s:Run()
  qall!
catch
  call s:Check(0, v:exception . ' at ' . v:throwpoint)
endtry
