package railwalk.device;

/** Numbers of data files: a decimal number, an SI prefix, unit letters: 1.2mA, 62.5k, 20uF. */
final class Figure {
  private Figure() {}

  /** Returns the number in SI units, or NaN when {@code text} is none. */
  static double parse(String text) {
    int end = 0;
    while (end < text.length() && isNumberPart(text, end)) {
      end++;
    }
    String unit = text.substring(end);
    double scale = unit.isEmpty() ? 1 : scale(unit.charAt(0));
    try {
      return end == 0 ? Double.NaN : Double.parseDouble(text.substring(0, end)) * scale;
    } catch (NumberFormatException e) {
      return Double.NaN;
    }
  }

  private static boolean isNumberPart(String text, int at) {
    char c = text.charAt(at);
    if (Character.isDigit(c) || c == '.' || c == '-' || c == '+') {
      return true;
    }
    return (c == 'e' || c == 'E')
        && at + 1 < text.length()
        && !Character.isLetter(text.charAt(at + 1));
  }

  private static double scale(char prefix) {
    return switch (prefix) {
      case 'p' -> 1e-12;
      case 'n' -> 1e-9;
      case 'u' -> 1e-6;
      case 'm' -> 1e-3;
      case 'k' -> 1e3;
      case 'M' -> 1e6;
      default -> 1;
    };
  }
}
