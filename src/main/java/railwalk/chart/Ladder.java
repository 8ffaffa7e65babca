package railwalk.chart;

import java.util.List;

/**
 * The drawing of the supply: from each rectifier the rail runs through its droppers from node to
 * node; where a node feeds several others it branches.
 */
public record Ladder(List<Feed> feeds) implements Block {

  /** What stands at the head of a rail. */
  public enum Source {
    TUBE_RECTIFIER,
    DIODE_RECTIFIER,
    FIXED_SOURCE
  }

  /** The sign a dropper is drawn with. */
  public enum Symbol {
    RESISTOR,
    CHOKE,
    FUSE,
    SWITCH,
    DIODE,
    LAMP,
    /** A plain box, for anything else. */
    BOX
  }

  /**
   * The head of one rail.
   *
   * @param negative whether the rail stands below the reference
   * @param name of the rectifier or source
   * @param lines what else is to be said of it
   * @param rail the way to the first node
   */
  public record Feed(Source source, boolean negative, String name, List<String> lines, Span rail) {
    public Feed {
      lines = List.copyOf(lines);
    }
  }

  /**
   * A supply node.
   *
   * @param volts expected, with unit
   * @param lines what else is to be said of it: band, what it feeds, ripple
   * @param spans the ways on, the longest first
   */
  public record Stop(String node, String volts, List<String> lines, List<Span> spans) {
    public Stop {
      lines = List.copyOf(lines);
      spans = List.copyOf(spans);
    }

    /** Returns the greatest number of spans between here and an end of the rail. */
    public int depth() {
      return spans.stream().mapToInt(span -> 1 + span.to().depth()).max().orElse(0);
    }
  }

  /**
   * The way from one node to the next.
   *
   * @param parts passed on it, in feeding order; none where it is plain wire
   */
  public record Span(List<Part> parts, Stop to) {
    public Span {
      parts = List.copyOf(parts);
    }
  }

  /**
   * One dropper.
   *
   * @param value such as "4.7 kΩ"
   * @param load such as "5.1 mA · 0.12 W"
   */
  public record Part(Symbol symbol, String name, String value, String load) {}

  public Ladder {
    feeds = List.copyOf(feeds);
  }

  @Override
  public void accept(BlockVisitor visitor) {
    visitor.visit(this);
  }
}
