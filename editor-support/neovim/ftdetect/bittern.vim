autocmd BufRead,BufNewFile *.bittern setfiletype bittern
