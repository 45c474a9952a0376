" Drives Vim with ALE against a real server: findings, hover, an applied fix. Run by test.sh.
set nocompatible nomore noswapfile hidden
filetype plugin on
let g:ale_hover_to_preview = 1
let g:ale_lint_on_text_changed = 'always'
let g:ale_lint_delay = 0

function! s:Say(text) abort
  call writefile([a:text], $SETTLEWELL_TEST_RESULT, 'a')
endfunction

function! s:Fail(text) abort
  call s:Say('FAILED: ' . a:text)
  cquit!
endfunction

function! s:Await(what, condition) abort
  let l:tries = 0
  while !a:condition()
    let l:tries += 1
    if l:tries > 1200
      call s:Fail(a:what . ' never came')
    endif
    sleep 50m
  endwhile
endfunction

function! s:Findings() abort
  return map(copy(ale#engine#GetLoclist(bufnr('%'))), 'v:val.text')
endfunction

function! s:Preview() abort
  for l:window in range(1, winnr('$'))
    if getwinvar(l:window, '&previewwindow')
      return join(getbufline(winbufnr(l:window), 1, '$'), ' ')
    endif
  endfor
  return ''
endfunction

function! s:Test() abort
  execute 'edit ' . fnameescape($SETTLEWELL_TEST_SHEET)
  call s:Await('the finding', {-> !empty(s:Findings())})
  if join(s:Findings()) !~# 'offered'
    call s:Fail('other findings: ' . join(s:Findings()))
  endif
  call search('needs:')
  ALEHover
  call s:Await('the hover', {-> s:Preview() =~# 'error at 95'})
  call search('13 cycles')
  call setline('.', substitute(getline('.'), 'acquisition:.*', 'acquisition: 12 cycles', ''))
  doautocmd TextChanged
  call s:Await('the end of the finding', {-> empty(s:Findings())})
  call s:Say('passed: findings, hover, an edit')
  qall!
endfunction

autocmd VimEnter * call timer_start(0, {-> s:Test()})
