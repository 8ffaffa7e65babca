grammar Netlist;
netlist : WORD* EOF ;
WORD : [A-Za-z0-9]+ ;
JUNK : . ;
