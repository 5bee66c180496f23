if exists('b:did_ftplugin')
  finish
endif
let b:did_ftplugin = 1

setlocal commentstring=//\ %s
setlocal comments=://
setlocal expandtab shiftwidth=4 softtabstop=4
" Names hold hyphens: milk-of-lime is one word.
setlocal iskeyword+=-

" :make shows the mistakes of the recipe in the quickfix list.
setlocal makeprg=bittern\ check\ %:S
setlocal errorformat=%Eerror\ %m,%Wwarning\ %m,%Inote\ %m,%C\ \ -->\ %f:%l:%c,%-G%.%#

let b:undo_ftplugin = 'setlocal commentstring< comments< expandtab< shiftwidth< softtabstop< iskeyword< makeprg< errorformat<'
