package railwalk.netlist;

import railwalk.source.SourceSpan;

/**
 * One word of a netlist line, with its place.
 *
 * @param text without the braces or quotes around it
 */
record Word(String text, SourceSpan span, Form form) {
  /** How it was written. */
  enum Form {
    PLAIN,
    /** Between double quotes. */
    QUOTED,
    /** Between braces or single quotes: an expression. */
    EXPRESSION
  }

  /** Returns whether it is the keyword, in any case. */
  boolean is(String keyword) {
    return form == Form.PLAIN && text.equalsIgnoreCase(keyword);
  }

  /** Returns whether it is an expression. */
  boolean isExpression() {
    return form == Form.EXPRESSION;
  }

  /** Returns whether it says that the value is not known. */
  boolean isUnknown() {
    return is("?");
  }
}
