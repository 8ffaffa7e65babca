package railwalk.chart;

import java.math.BigInteger;
import java.util.Comparator;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The order in which people count part names: V2 before V10, letters without regard to case. */
final class NaturalOrder implements Comparator<String> {
  static final NaturalOrder INSTANCE = new NaturalOrder();

  private static final Pattern RUN = Pattern.compile("[0-9]+|[^0-9]+");

  private NaturalOrder() {}

  @Override
  public int compare(String first, String second) {
    Matcher a = RUN.matcher(first);
    Matcher b = RUN.matcher(second);
    while (true) {
      boolean moreA = a.find();
      boolean moreB = b.find();
      if (!moreA || !moreB) {
        return moreA ? 1 : moreB ? -1 : first.compareTo(second);
      }
      int order = compareRuns(a.group(), b.group());
      if (order != 0) {
        return order;
      }
    }
  }

  private static int compareRuns(String a, String b) {
    boolean numbers = startsWithDigit(a) && startsWithDigit(b);
    return numbers ? new BigInteger(a).compareTo(new BigInteger(b)) : a.compareToIgnoreCase(b);
  }

  private static boolean startsWithDigit(String run) {
    char first = run.charAt(0);
    return first >= '0' && first <= '9';
  }
}
