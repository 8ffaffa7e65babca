package railwalk.device;

import java.util.ArrayList;
import java.util.List;

/**
 * Sections of one type that share published points and a law.
 *
 * @param kind their word in the data file: "triode", "pentode", "beam", "rectifier", "diode"
 * @param ids their ids, in file order; a single empty one when the type has one section
 */
public record LikeSections(String kind, List<String> ids) {
  /** Keeps a copy of the ids. */
  public LikeSections {
    ids = List.copyOf(ids);
  }

  /** Returns the id of the first of them. */
  public String first() {
    return ids.get(0);
  }

  /** Returns whether they amplify. */
  public boolean amplify() {
    return kind.equals("triode") || kind.equals("pentode") || kind.equals("beam");
  }

  LikeSections and(String id) {
    List<String> all = new ArrayList<>(ids);
    all.add(id);
    return new LikeSections(kind, all);
  }
}
