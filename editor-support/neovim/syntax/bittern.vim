" Bittern recipes. The words are those of src/Bittern.Language/Lexing/Keywords.cs; a test compares.
if exists('b:current_syntax')
  finish
endif

syntax case match
syntax iskeyword @,48-57,_,-

syntax match bitternFormula /\v<(e-|\(?[A-Z][A-Za-z0-9]*(\((aq|g|s|l|[IVX]+|[A-Z][A-Za-z0-9]*)\)\d*)*([A-Z][A-Za-z0-9]*)*([·*]\d*[A-Z][A-Za-z0-9()]*)*(\^\d*[-+]|[-+](\W|$)@=)?)/
syntax match bitternConstant /\v<(Ksp|pKsp|pK|KH|K|ΔH|dH)>/
syntax match bitternQuantity /\v<(SI|TDS|Eh|Q|pe)>/
syntax match bitternQuantity /\v<[a-z][A-Za-z0-9-]*(\()@=/
syntax match bitternNumber /\v([A-Za-z0-9.])@<![-+]?(10\^[-+]?\d+(\.\d+)?|\d+(\.\d+)?([eE][-+]?\d+)?)/ nextgroup=bitternUnit skipwhite
syntax match bitternUnit /\v(\%|°C|[µA-Za-z][A-Za-z0-9µ]*(\/[A-Za-zµ][A-Za-z0-9µ]*)+|[kmµn]?(g|L|mol|eq|m3|atm|bar|Pa|K|s|h|d|S|V|Bq|J)>|(t|min|ppm|ppb|points|relative)>)/ contained
syntax match bitternDate /\v<\d{4}-\d\d-\d\d>/
syntax match bitternOperator /\v±|\<\=|\>\=|≤|≥|[<>=]|\.\./
syntax match bitternCitation /\v\[[a-z][A-Za-z0-9-]*\]/

syntax keyword bitternDeclaration recipe use cite element ion solute complex solid gas half-reaction override
syntax keyword bitternDeclaration set ion-size truesdell-jones sit pitzer pitzer-slope theta psi lambda zeta
syntax keyword bitternDeclaration liquor reagent atmosphere train stage limits report mix
syntax keyword bitternAction feed add blend contact oxidise reduce form hold settle heat cool
syntax keyword bitternProperty client reference revision date temperature activity pH alkalinity density charge purity price text
syntax keyword bitternWord any as at back because by catalogue closed doubt except from half held limit log most of on
syntax keyword bitternWord recalled solids to until valid which with within zero

syntax match bitternComment +//.*$+ contains=@Spell
syntax region bitternText start=+"+ end=+"\|$+ oneline contains=@Spell
syntax include @bitternMarkdown syntax/markdown.vim
unlet! b:current_syntax
syntax region bitternMarkdownText matchgroup=bitternText start=+"""+ end=+"""+ contains=@bitternMarkdown,@Spell keepend

highlight default link bitternDeclaration Statement
highlight default link bitternAction Function
highlight default link bitternProperty Type
highlight default link bitternWord Keyword
highlight default link bitternFormula Constant
highlight default link bitternConstant Identifier
highlight default link bitternQuantity Identifier
highlight default link bitternNumber Number
highlight default link bitternUnit Special
highlight default link bitternDate Number
highlight default link bitternOperator Operator
highlight default link bitternCitation Tag
highlight default link bitternComment Comment
highlight default link bitternText String

let b:current_syntax = 'bittern'
