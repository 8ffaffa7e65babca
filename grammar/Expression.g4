/* An expression between braces or quotes: numbers with SPICE suffixes, parameters, functions. */
grammar Expression;

whole
    : expression EOF
    ;

expression
    : NUMBER                                                  # number
    | NAME LPAREN expression (COMMA expression)* RPAREN       # function
    | NAME                                                    # parameter
    | LPAREN expression RPAREN                                # parentheses
    | <assoc = right> expression POWER expression             # power
    | sign = (PLUS | MINUS) expression                        # signed
    | expression operator = (TIMES | DIVIDE) expression       # product
    | expression operator = (PLUS | MINUS) expression         # sum
    ;

POWER
    : '^'
    | '**'
    ;

TIMES
    : '*'
    ;

DIVIDE
    : '/'
    ;

PLUS
    : '+'
    ;

MINUS
    : '-'
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

NUMBER
    : ([0-9]+ ('.' [0-9]*)? | '.' [0-9]+) ([eE] [+\-]? [0-9]+)? [A-Za-z0-9\u00B5\u03BC\u03A9\u2126]*
    ;

NAME
    : [A-Za-z_] [A-Za-z0-9_.]*
    ;

BLANKS
    : [ \t\f\u00A0]+ -> skip
    ;

JUNK
    : .
    ;
