package railwalk.netlist;

import static railwalk.source.Severity.ERROR;
import static railwalk.source.Severity.NOTE;
import static railwalk.source.Severity.WARNING;

import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.Severity;
import railwalk.source.SourceSpan;

/**
 * Everything that can be said about a netlist's text. The constant's name in lower case with
 * hyphens is its code; {@code %1$s} and so on are filled from where it is found.
 */
enum Problem {
  // the file
  NOT_A_NETLIST(
      ERROR,
      "%1$s is no netlist but %2$s",
      "wanted: a plain text file, a title on line 1 and then one part on each line"),
  EMPTY_FILE(
      ERROR, "%1$s is empty", "a netlist has a title on line 1 and then one part on each line"),
  NO_PARTS(
      ERROR,
      "there is no part in this netlist",
      "line 1 is always the title; the parts follow below it"),
  TITLE_LIKE_ELEMENT(
      WARNING,
      "line 1 is the title, though it reads like a part or a dot line",
      "put a title above it if it was meant as one"),
  TOO_MANY_PARTS(ERROR, "more than %1$d parts: a sub-circuit has run away", ""),

  // the shape of a line
  LINE_START(
      ERROR,
      "a line cannot start with %1$s",
      "it starts with a part's name or a dot word; a line that goes on with the one above starts with +"),
  NOTHING_TO_CONTINUE(ERROR, "there is no line above that this one could go on with", ""),
  UNCLOSED_BRACE(
      ERROR, "this brace is never closed", "an expression stands between { and } on one line"),
  UNCLOSED_QUOTE(
      ERROR, "this quote is never closed", "an expression stands between two ' on one line"),
  UNCLOSED_PARENTHESIS(ERROR, "this parenthesis is never closed", ""),
  STRAY_SIGN(ERROR, "%1$s has no business here", ""),
  STRAY_PARENTHESES(
      ERROR, "parentheses after %1$s mean nothing here", "a remark stands behind a ;"),
  UNPRINTABLE_SIGN(
      ERROR,
      "a sign that cannot be printed (%1$s)",
      "delete it and type the words around it again"),
  NOTHING_AFTER_EQUALS(ERROR, "nothing stands after this =", ""),
  NOTHING_BEFORE_EQUALS(ERROR, "nothing stands before this =", ""),
  DECIMAL_COMMA(
      ERROR,
      "one value is wanted here, not two with a comma between",
      "the decimal sign is a period: %1$s.%2$s"),
  COMMA_BETWEEN_WORDS(
      ERROR,
      "a comma before %1$s",
      "blanks stand between words, and a period marks decimals: 4.7k or 4k7"),
  WORD_PASSED_OVER(WARNING, "%1$s means nothing to %2$s and is passed over", ""),
  OPTION_PASSED_OVER(WARNING, "%1$s means nothing to %2$s and is passed over", "%3$s"),

  // nodes and names
  BAD_NODE_NAME(
      ERROR,
      "%1$s cannot be the name of a node",
      "a node's name has no period, blank, comma, quote, brace or parenthesis"),
  NODES_MISSING(ERROR, "%1$s needs %2$d nodes; there are %3$d", ""),
  NAME_TWICE(
      ERROR,
      "%1$s stands on line %2$s already",
      "give one of the two another name; the X of an X line does not count"),
  X_KEPT(NOTE, "%1$s keeps its X on the chart, since %2$s is another part", ""),
  NO_SUCH_PART(ERROR, "there is no %1$s", "%2$s"),
  NO_SUCH_NODE(ERROR, "there is no node %1$s", "%2$s"),
  NODE_OF_ONE_PART(NOTE, "nothing but %2$s is connected to node %1$s", "%3$s"),
  ACROSS_NOTHING(WARNING, "both ends of %1$s are on node %2$s: it does nothing", ""),
  UNKNOWN_PART(
      ERROR,
      "no kind of part starts like %1$s",
      "R C L V I D E F G H K, and X for tubes, pots, switches, fuses, lamps and sub-circuits"),
  TRANSISTOR(
      ERROR,
      "%1$s: transistors are not read",
      "leave it out, or put what it does to the tubes' supply in its place (V, R)"),
  KEYWORD_MISSING(
      ERROR,
      "%1$s: a part of this kind needs its word",
      "XP1 a wiper b POT 50k, XS1 a b SWITCH closed, XN1 a b NE2"),
  X_LINE_EMPTY(
      ERROR, "%1$s: nothing follows the name", "XV1 12AX7 1=p1 2=g1 3=k1 or XV1A p1 g1 k1 12AX7"),

  // values
  VALUE_MISSING(ERROR, "%1$s: the value is missing", "%2$s is wanted here: %3$s"),
  RATING_FOR_VALUE(ERROR, "%1$s: value missing, %2$s is a rating", "%3$s is wanted first: %4$s"),
  NOT_A_VALUE(ERROR, "%1$s cannot be read as %2$s", "%3$s"),
  LETTER_FOR_DIGIT(ERROR, "%1$s has a letter where a digit should be", "did you mean %2$s?"),
  WRONG_UNIT(ERROR, "%1$s is %2$s, but %3$s is wanted here", "write it like %4$s"),
  TWO_VALUES(
      ERROR,
      "%1$s has two values, %2$s and %3$s",
      "two nodes stand before the value, ratings after"),
  OUT_OF_RANGE(ERROR, "%1$s is beyond any number", ""),
  NEGATIVE_VALUE(
      ERROR, "%1$s: %2$s cannot be negative", "to turn a part round, exchange its nodes"),
  ZERO_VALUE(ERROR, "%1$s: %2$s of zero makes no sense here", ""),
  SMALL_M_ON_RESISTANCE(ERROR, "%1$s: a small m is milli, which no resistance here can be", "%2$s"),
  CAPITAL_M_IS_MEGA(NOTE, "capital M on a resistance read as megohm: %1$s", ""),
  BARE_CAPACITANCE(ERROR, "%1$s would be farads", "%2$s"),
  BARE_FARADS(
      WARNING, "%1$s without a letter is read as farads", "write %1$su if microfarad is meant"),
  MILLIFARAD(WARNING, "%1$s is read as millifarad", "write u for microfarad"),
  OLD_MARK_IS_MICRO(NOTE, "mf and mfd read as microfarad, as old capacitors are marked: %1$s", ""),
  OLD_MARK_IS_PICO(
      NOTE, "mmf, mmfd and uuF read as picofarad, as old capacitors are marked: %1$s", ""),
  LETTERS_IGNORED(
      WARNING, "the letters after the number in %1$s are no unit and are passed over", ""),
  RESISTANCE_TINY(
      WARNING,
      "%1$s comes to less than 0.01 ohm",
      "in an expression M is milli, as in SPICE; megohm is meg"),
  M_CODE_IN_EXPRESSION(
      ERROR, "%1$s is milli to one reader and mega to another", "write %2$s, or m for milli"),
  VALUE_UNKNOWN(
      NOTE,
      "the %2$s of %1$s is to be found from readings",
      "no chart can be made before it is known"),
  RESISTOR_IS_WIRE(NOTE, "%1$s has no resistance: taken as a piece of wire", ""),

  // expressions and parameters
  EXPRESSION_SYNTAX(ERROR, "%1$s does not fit into this expression", ""),
  EXPRESSION_BREAKS_OFF(ERROR, "the expression %1$s breaks off", ""),
  EXPRESSION_TOO_LONG(ERROR, "this expression is too long or too deep", "split it with .param"),
  EXPRESSION_NUMBER(ERROR, "%1$s cannot be read as a number", "%2$s"),
  EXPRESSION_NOT_FINITE(
      ERROR, "%1$s comes to no number", "a division by zero, or the root or logarithm of nothing?"),
  FUNCTION_UNKNOWN(ERROR, "there is no function %1$s", "%2$s"),
  FUNCTION_ARGUMENTS(ERROR, "%1$s takes %2$d values; there are %3$d", ""),
  PARAMETER_UNKNOWN(ERROR, "there is no parameter %1$s", "%2$s"),
  PARAMETER_SHAPE(ERROR, "%1$s is no parameter with its value", ".param leak=470k"),
  PARAMETER_CIRCLE(ERROR, "parameter %1$s hangs on itself", ""),

  // parts
  COIL_WITHOUT_RESISTANCE(
      WARNING,
      "what is the winding resistance of %1$s? Without it, it counts as a short",
      "write rdc= and the ohms measured across it"),
  COUPLED_COILS(NOTE, "coupled coils are no part at DC: %1$s", ""),
  COUPLING_SHORT(ERROR, "%1$s needs two coils and a factor", "K1 L1 L2 0.99"),
  COUPLING_FACTOR(WARNING, "%1$s is no coupling factor", "it lies between 0 and 1"),
  SIGNAL_ONLY_DC(
      NOTE,
      "the signal of %1$s is passed over: only its DC part counts",
      "a winding is written RMS 325"),
  CONTROL_MISSING(ERROR, "%1$s: the source whose current controls it is missing", "F1 a b V1 10"),
  CONTROL_NOT_SOURCE(
      ERROR,
      "%1$s is no voltage source, so its current cannot control anything",
      "put a V of 0 volts in series and name that"),
  SOURCE_NOT_LINEAR(ERROR, "%1$s is no linear source", "only E1 a b c d 10 and the like are read"),
  SOURCE_LOOP(
      ERROR,
      "%1$s closes a loop of voltage sources and wire: no current would be right",
      "give one of them its resistance: rdc="),
  DIODE_GENERIC(NOTE, "taken as a usual silicon rectifier: %1$s", ""),
  DIODE_MAYBE_ZENER(
      WARNING,
      "%1$s looks like a zener diode and is taken as a plain silicon one",
      "write ZENER and its volts: ZENER 12V"),
  MODEL_CONSTANT(ERROR, "%1$s=%2$s makes no diode", ""),
  POT_NODES(
      ERROR,
      "%1$s needs 3 nodes before POT; there are %2$d",
      "end a, wiper, end b; for a variable resistor name the wiper's node twice"),
  POT_SET_ASSUMED(NOTE, "taken as set half-way, since set= is missing: %1$s", ""),
  POT_SET_RANGE(
      ERROR,
      "%1$s is no share of the track",
      "set= lies between 0 (wiper at end b) and 1 (wiper at end a)"),
  SWITCH_POSITION_MISSING(
      ERROR, "%1$s: which position is it in?", "closed, open, or the number of the contact in use"),
  SWITCH_POSITION(
      ERROR, "%1$s is no position of %2$s", "closed, open, or a contact from 1 to %3$d"),
  FUSE_UNRATED(
      NOTE, "%1$s has no rating: nothing can be said about how near it is", "XF1 a b FUSE 500mA"),
  LAMP_RATING(
      ERROR, "%1$s: a lamp needs its volts and its current", "LAMP 6.3V 150mA or LAMP 120V 25W"),

  // windings
  TAP_COUNT(
      ERROR,
      "%1$d nodes do not go with the figures %2$s",
      "one figure for each node, such as %3$s"),
  TAP_ORDER(
      ERROR,
      "%1$s: the figures must rise from one tap marked 0 to both ends",
      "325-0-325 or 325-60-0-325"),
  TAP_RESISTANCES(
      ERROR,
      "%1$s has %2$d sections; rdc gives %3$d",
      "one resistance for each section: rdc=95,101"),
  ZERO_OHM_WINDING(
      ERROR,
      "%1$s: a winding of no resistance would feed any current",
      "measure it with the tubes out, or leave rdc= away"),
  WINDING_WITHOUT_RESISTANCE(NOTE, "no rdc=, so a usual regulation is assumed: %1$s", ""),
  WINDING_SHORTED(
      ERROR, "%1$s: two ends or taps are on one node, which shorts the turns between them", ""),
  LOAD_WITHOUT_RESISTANCE(
      WARNING,
      "%1$s: load= cannot be worked back without rdc=, so its volts are taken as open-circuit",
      ""),
  NO_SUCH_TRANSFORMER(ERROR, "there is no .transformer %1$s", "%2$s"),
  WALL_ASSUMED(
      WARNING,
      "%1$s is taken as the wall outlet itself, with no transformer between",
      "if it is a winding write rdc= or on=; if it is the wall call it VLINE"),

  // tubes
  UNKNOWN_TYPE(ERROR, "unknown tube type or sub-circuit %1$s", "%2$s"),
  ELECTRODE_UNKNOWN(ERROR, "%1$s is neither a pin nor an electrode", "%2$s"),
  ELECTRODE_NOT_IN_TYPE(ERROR, "the %1$s has no %2$s", ""),
  PINS_AND_ELECTRODES(ERROR, "%1$s: pins and electrodes do not mix in one line (%2$s)", ""),
  PINS_AND_POSITIONS(
      ERROR,
      "%1$s is wired by pins and otherwise on line %2$d",
      "use one way for all sections of a tube"),
  PINS_NOT_KNOWN(
      ERROR,
      "no source for the pins of the %1$s is known",
      "name its electrodes instead: plate= grid= cathode="),
  NO_SUCH_PIN(ERROR, "the %1$s has no %2$s", "its pins are %3$s"),
  PIN_TWICE(ERROR, "%1$s of %2$s is wired twice", ""),
  PINS_JOINED(
      WARNING,
      "pins %2$d and %3$d of the %1$s are %4$s, joined inside, and stand on two nodes here",
      "the tube makes one node of the two while it is in"),
  PINS_BY_CUSTOM(
      NOTE, "named by position, so the socket pins on the chart are bench custom: %1$s", ""),
  SECTION_ASSUMED(NOTE, "no section letter, so taken as the first section of its type: %1$s", ""),
  SECTION_NEEDED(
      ERROR,
      "the %1$s has unlike sections (%2$s): which one is %3$s?",
      "end its name with the letter, or name the pins"),
  TWIN_BY_POSITION(
      NOTE, "%1$s: six nodes taken as plate grid cathode of both sections of the %2$s", ""),
  TUBE_NODES_MISSING(ERROR, "%1$s: the %2$s needs %3$d nodes (%4$s); there are %5$d", ""),
  PENTODE_WITH_THREE_NODES(
      ERROR,
      "%1$s: the %2$s needs %3$d nodes (%4$s); there are %5$d",
      "for a triode connection name the plate's node twice"),
  TOO_MANY_NODES(ERROR, "%1$s has more nodes than the %2$s has electrodes", ""),
  HEATER_NODES_IGNORED(NOTE, "further nodes taken as the heater's and passed over: %1$s", ""),
  TRIODE_CONNECTED(
      NOTE, "%1$s: the header names no screen, so it is taken as tied to the plate", ""),
  SUPPRESSOR_TIED(NOTE, "suppressor not listed, so taken as tied to the cathode: %1$s", ""),
  ELECTRODE_OPEN(WARNING, "%1$s: nothing is wired to the %2$s%3$s", ""),
  TIE_POINT_IN_USE(WARNING, "pin %1$d of the %2$s is no free tie point: it leads to %3$s", ""),
  PIN_CAUTION(
      WARNING,
      "%1$s is wired by pin; of the %2$s mind this: %3$s",
      "compare the socket's wiring with the pins on the chart"),
  PIN_STRAP(
      WARNING,
      "%1$s: it is not known whether pins %2$s of the %3$s are joined inside",
      "wire them together at the socket, and list them all"),
  NO_SECTION(WARNING, "%1$s does nothing: no plate or grid of the %2$s is wired", ""),
  BOTTLE_OF_TWO_TYPES(ERROR, "%1$s is %2$s on line %3$d and %4$s here", ""),
  STAND_IN(
      NOTE,
      "%1$s stands in for a type that is not in the catalogue: its currents are as written",
      ""),
  STAND_IN_NODE(
      ERROR, "draws %1$s=, but no node is given for it", "name it before draws: %1$s=NODE"),
  STAND_IN_DRAWS(ERROR, "%1$s: what does it draw?", "draws plate=2.6mA screen=7.5mA"),
  STAND_IN_CATHODE(ERROR, "%1$s: its cathode is missing", "the currents leave there: cathode=NODE"),
  STAND_IN_PIN(
      ERROR,
      "the pins of a stand-in are not known (%1$s)",
      "name its electrodes: plate=NODE screen=NODE cathode=NODE"),

  // sub-circuits and includes
  SUBCKT_NODES(ERROR, "%1$s has %2$d nodes; there are %3$d", "in this order: %4$s"),
  SUBCKT_PARAMETER(WARNING, "%1$s has no parameter %2$s", "%3$s"),
  SUBCKT_CIRCLE(ERROR, "%1$s contains itself", ""),
  SUBCKT_TWICE(ERROR, ".subckt %1$s stands on line %2$d already", ""),
  SUBCKT_WITHOUT_ENDS(ERROR, ".subckt %1$s is never ended", ".ends closes it"),
  ENDS_WITHOUT_SUBCKT(ERROR, "this .ends closes nothing", ""),
  INCLUDE_MISSING(NOTE, "no file %1$s: passed over", ""),
  INCLUDE_REFUSED(
      ERROR,
      "%1$s lies where a netlist may not reach",
      "put it in the netlist's folder or below, or straight into a folder above"),
  INCLUDE_UNREADABLE(ERROR, "%1$s cannot be included: %2$s", ""),
  INCLUDE_CIRCLE(ERROR, "%1$s includes itself", ""),

  // dot lines
  DOT_LINES_PASSED_OVER(NOTE, "dot lines without a meaning here are passed over: %1$s", ""),
  DOT_WORD_MISTYPED(WARNING, "%1$s means nothing here and is passed over", "%2$s"),
  DOT_LINE_NAMELESS(ERROR, "%1$s: the name is missing", ""),
  COMMANDS_WITHOUT_END(
      WARNING,
      "this block of commands is never ended, so all that follows is passed over",
      ".endc closes it"),
  TUBE_KEY(ERROR, "%1$s means nothing on a .tube line", "%2$s"),
  TUBE_KEY_TWICE(ERROR, "%1$s is given twice", ""),
  TUBE_WORD(ERROR, "%1$s=%2$s: there is no such word", "one of %3$s"),
  TUBE_SIGN(ERROR, "%1$s: %2$s of a tube type is above zero here", "grid volts alone go below"),
  TUBE_TWICE(ERROR, "type %1$s is given on line %2$d already", ""),
  TUBE_REPLACES(NOTE, "%1$s as given here takes the place of the catalogue's", ""),
  TUBE_LIKE(ERROR, "there is no type %1$s that this one could be like", "%2$s"),
  TUBE_EMPTY(
      ERROR,
      "nothing is said of %1$s that a law could be made of",
      "a type that it is like, or a point: plate=250 grid=-2 current=1.2mA"),
  TUBE_BASE(ERROR, "no type of the catalogue has the base %1$s", "%2$s"),
  TUBE_BASE_MISSING(
      ERROR,
      "%1$s: what base has it?",
      "base=9A, a kind of socket such as base=octal, or like= a type of the same base"),
  TUBE_PINS_BY_BASE(NOTE, "pins of %1$s by the base %2$s, as the %3$s has them", ""),
  TUBE_PINS_OPEN(
      NOTE,
      "the pins of %1$s are not known, so it can be wired by electrode alone",
      "1=plate 2=grid 3=cathode on its .tube line"),
  TUBE_HEATER(ERROR, "%1$s is no heater", "volts and amperes: heater=6.3V,0.3A"),
  TUBE_DATA(ERROR, "%1$s: %2$s", "%3$s"),
  TUBE_FIT_POOR(
      WARNING,
      "the law of %1$s misses a current given for it by %2$d %%",
      "points of one tube, and their units right?"),
  TUBES_FILE(
      ERROR,
      "%1$s stands before the first type line",
      "a file of types is read as the catalogue's own are: type NAME, then its lines"),
  TUBES_FILE_EMPTY(ERROR, "there is no type in %1$s", "type NAME begins one"),
  SETTING_TWICE(WARNING, "%1$s stands on line %2$d already", "the last one counts"),
  SETTING_EMPTY(ERROR, "%1$s: something is missing", "%2$s"),
  LINE_NOT_STATED(
      NOTE, "no .line: windings hold as written, at %1$s Hz", ".line 120 60 design=117"),
  LINE_RANGE(ERROR, "%1$s cannot be the line's %2$s", ".line 120 60"),
  TRANSFORMER_SHORT(
      ERROR, ".transformer %1$s needs primary volts and resistance", "primary=120 rdc=17.5"),
  TRANSFORMER_TWICE(ERROR, "there are two transformers %1$s", ""),
  METER_SPEC(ERROR, "%1$s describes no meter", "10M, or 20k/V and its ranges"),
  SPREAD_LIMIT(ERROR, "%1$s is no limit", "per cent are wanted: 10%%"),
  SPREAD_WORD(ERROR, "%1$s is no kind of spread", "%2$s or %3$s"),
  SPREAD_BOTH(
      ERROR,
      "used tubes and limits for new ones in one line",
      "tubes=used, or tube= and its per cent"),
  WORDS_UNKNOWN(ERROR, "there are no %1$s words", "british or american"),
  STATE_EMPTY(WARNING, "state %1$s changes nothing", "S1=open V3=out V5=GZ34 P1=0.2 line=108"),
  STATE_LINE(ERROR, "a state sets other line volts, but the netlist states none", ".line 120 60"),
  STATE_OF_PART(
      ERROR, "a state cannot set %1$s", "switches, tubes, controls and the line can be set"),
  STATE_LOOK_ALIKE(WARNING, "%1$s is another tube than %2$s (the %3$s: %4$s)", ""),
  STATE_SOCKET(ERROR, "%1$s (%2$s) does not go into the socket of %3$s (%4$s)", "");

  private final Severity severity;
  private final String message;
  private final String hint;

  Problem(Severity severity, String message, String hint) {
    this.severity = severity;
    this.message = message;
    this.hint = hint;
  }

  /** Returns the code that diagnostics carry. */
  String code() {
    return Diagnostic.code(this);
  }

  /** Returns the diagnostic about {@code span}; null is the file as a whole. */
  Diagnostic at(@Nullable SourceSpan span, Object... words) {
    return Diagnostic.of(this, severity, message, hint, span, words);
  }
}
