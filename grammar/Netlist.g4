/*
 * The netlist as lines of words. Nothing here knows a resistor from a tube: the assembler in
 * railwalk.netlist reads the words. The title line is left out before; every text starts and ends
 * with a newline, and the reader asks for one line after another, so that a broken one spoils no
 * other.
 */
grammar Netlist;

line
    : (field (COMMA? field)*)? NEWLINE
    ;

field
    : WORD EQUALS value (COMMA value)*  # option
    | WORD LPAREN argument* RPAREN      # call
    | LPAREN argument* RPAREN           # group
    | value                             # bare
    ;

argument
    : WORD EQUALS value
    | value
    | COMMA
    ;

value
    : WORD
    | STRING
    | EXPRESSION
    ;

// a line that starts with + goes on with the line above, over comment and blank lines in between
CONTINUE
    : GAP '+' -> channel(HIDDEN)
    ;

NEWLINE
    : GAP
    ;

fragment GAP
    : EOL (BLANK* ([*;] ~[\r\n]*)? EOL)* BLANK*
    ;

fragment EOL
    : '\r'? '\n'
    | '\r'
    ;

fragment BLANK
    : [ \t\f\u00A0\u2000-\u200B\u202F\u3000\uFEFF]
    ;

BLANKS
    : BLANK+ -> skip
    ;

COMMENT
    : ';' ~[\r\n]* -> skip
    ;

EQUALS
    : '='
    ;

LPAREN
    : '('
    ;

RPAREN
    : ')'
    ;

COMMA
    : ','
    ;

// braces in braces once, so that a long row of open ones is no work
EXPRESSION
    : '{' (~[{}\r\n] | '{' ~[{}\r\n]* '}')* '}'
    | '\'' ~['\r\n]* '\''
    ;

STRING
    : '"' ~["\r\n]* '"'
    ;

// any run of printable signs that have no meaning of their own
WORD
    : ~[\u0000-\u0020\u007F-\u00A0\u2000-\u200B\u202F\u3000\uFEFF=(){}',;]+
    ;

JUNK
    : .
    ;
