package railwalk.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import railwalk.circuit.AmplifierSection;
import railwalk.circuit.Circuit;
import railwalk.circuit.Node;
import railwalk.device.Electrode;
import railwalk.solve.OperatingPoint;
import railwalk.solve.SectionPoint;
import railwalk.units.Quantity;
import railwalk.walk.DcPath;
import railwalk.walk.DcPaths;
import railwalk.walk.DcStep;
import railwalk.walk.SupplyNode;

/** Why an electrode of an amplifying section stands where it does. */
final class WalkTube {
  /** Volts that no meter shows. */
  private static final double NO_VOLTS = 5e-4;

  /** Less of a cathode's current than this may go another way untold. */
  private static final double NOTABLE_SHARE = 0.01;

  /** Current that drops nothing anyone would see. */
  private static final double NO_AMPS = 5e-9;

  private final OperatingPoint point;
  private final Circuit circuit;
  private final Wording wording;
  private final WalkLadder ladder;
  private final WalkBranch branch;
  private final AmplifierSection section;

  WalkTube(OperatingPoint point, Wording wording, WalkLadder ladder, AmplifierSection section) {
    this.point = point;
    this.circuit = point.circuit();
    this.wording = wording;
    this.ladder = ladder;
    this.branch = new WalkBranch(point);
    this.section = section;
  }

  /** Adds the walk to one electrode. */
  void add(Electrode electrode, WalkLines lines) {
    if (point.map().idleSections().contains(section.name())) {
      lines.add(
          wording.say(
              section.name() + " passes no current: its {plate} or cathode leads nowhere."));
      return;
    }
    DcPath path = new DcPaths(point.map(), circuit).to(section, electrode);
    supplyOf(path).ifPresent(supply -> ladder.addDownTo(supply, lines));
    switch (electrode) {
      case PLATE -> {
        branch.add(path, lines);
        lines.gap();
        addCircle(lines);
      }
      case SCREEN -> {
        branch.add(path, lines);
        lines.gap();
        addCircle(lines);
      }
      case CATHODE -> {
        List<DcStep> steps = WalkBranch.afterSupply(path);
        addPlateLoad(steps, lines);
        lines.gap();
        addCircle(lines);
      }
      default -> {
        addGrid(lines);
        lines.gap();
        addCircle(lines);
      }
    }
  }

  private Optional<SupplyNode> supplyOf(DcPath path) {
    return Optional.ofNullable(path.supply()).flatMap(point.map()::supplyNode);
  }

  /** Adds the sum down to the plate of a path that goes on through the tube. */
  private void addPlateLoad(List<DcStep> steps, WalkLines lines) {
    List<DcStep> load = WalkBranch.beforeTube(steps);
    if (!load.isEmpty()) {
      lines.add(branch.sum(load));
    }
  }

  /** Adds cathode, grid and screen, what the tube passes there, and the cross-check. */
  private void addCircle(WalkLines lines) {
    addCathode(lines);
    addGridLine(lines);
    addScreenLine(lines);
    WalkLaw law = new WalkLaw(point, wording, section);
    lines.add(law.sentence());
    law.crossCheck().ifPresent(lines::add);
  }

  private void addCathode(WalkLines lines) {
    List<DcStep> up = cathodeSteps();
    Node cathode = section.cathode();
    double volts = point.volts(cathode);
    if (up.isEmpty() || Math.abs(volts) < NO_VOLTS) {
      lines.add("Cathode (" + cathode.name() + ") at " + Quantity.volts(volts) + ".");
      return;
    }
    Node from = up.get(0).from();
    boolean fromReference = from.equals(circuit.reference());
    List<WalkSum.Term> terms = new WalkTerms(point).of(up);
    WalkSum.Printed sum =
        new WalkSum(
                fromReference ? "" : from.name(), point.volts(from), terms, cathode.name(), volts)
            .printed();
    String shares = terms.get(terms.size() - 1).ohmic() ? cathodeShares(sum.amps()) : "";
    lines.add(
        "Cathode: "
            + sum.text()
            + (shares.isEmpty() ? "" : " (" + shares + ")")
            + elsewhere(up.get(up.size() - 1)));
  }

  /** Returns the steps up to the cathode from the reference, or from a supply below it. */
  private List<DcStep> cathodeSteps() {
    DcPath path = new DcPaths(point.map(), circuit).to(section, Electrode.CATHODE);
    return branch.upFrom(path.back());
  }

  /** Returns what makes up the cathode's current where it is more than one plate's. */
  private String cathodeShares(WalkAmps whole) {
    List<WalkLoads.Share> shares = new ArrayList<>();
    for (AmplifierSection other : circuit.elements(AmplifierSection.class)) {
      if (other.cathode().equals(section.cathode())
          && !point.map().idleSections().contains(other.name())) {
        SectionPoint at = point.at(other);
        String name = other.name() + " ";
        shares.add(new WalkLoads.Share(name + wording.electrode(Electrode.PLATE), at.plateAmps()));
        if (!Double.isNaN(at.screenAmps())) {
          shares.add(new WalkLoads.Share(name + "screen", at.screenAmps()));
        }
      }
    }
    double sum = shares.stream().mapToDouble(WalkLoads.Share::amps).sum();
    boolean other = Math.abs(sum - Math.abs(whole.amps())) > whole.place();
    return shares.size() < 2 || other ? "" : WalkLoads.text(whole, shares);
  }

  /** Returns what of the cathode's current does not take the way of {@code last}. */
  private String elsewhere(DcStep last) {
    List<String> others = new ArrayList<>();
    double most = Math.abs(new WalkTerms(point).amps(last));
    for (DcStep step : DcPaths.at(circuit, section.cathode())) {
      double amps = new WalkTerms(point).amps(step);
      if (!step.element().equals(last.element()) && Math.abs(amps) > most * NOTABLE_SHARE) {
        others.add(
            step.element().name()
                + (amps > 0 ? " takes " : " brings ")
                + WalkAmps.said(Math.abs(amps)).text());
      }
    }
    return others.isEmpty() ? "" : "; besides, " + String.join(", ", others);
  }

  private void addGrid(WalkLines lines) {
    DcPath path = new DcPaths(point.map(), circuit).to(section, Electrode.GRID);
    List<DcStep> steps = WalkBranch.afterSupply(path);
    if (!steps.isEmpty()
        && steps.stream().noneMatch(step -> step.element() instanceof AmplifierSection)) {
      lines.add(branch.sum(steps));
    }
  }

  private void addGridLine(WalkLines lines) {
    Node grid = section.grid();
    double amps = point.at(section).gridAmps();
    StringBuilder line = new StringBuilder("Grid (" + grid.name() + ") at ");
    line.append(Quantity.volts(point.volts(grid)));
    driver().ifPresent(d -> line.append(", straight on ").append(d));
    if (Math.abs(amps) > NO_AMPS) {
      line.append(", grid current ").append(WalkAmps.said(amps).text());
    } else {
      line.append(": it draws no current, so its leak drops nothing");
    }
    lines.add(line.append('.').toString());
  }

  /** Returns whose plate or cathode the grid is wired to. */
  private Optional<String> driver() {
    for (AmplifierSection other : circuit.elements(AmplifierSection.class)) {
      if (other.plate().equals(section.grid())) {
        return Optional.of(wording.say("the {plate} of ") + other.name());
      }
      if (other.cathode().equals(section.grid()) && !other.equals(section)) {
        return Optional.of("the cathode of " + other.name());
      }
    }
    return Optional.empty();
  }

  private void addScreenLine(WalkLines lines) {
    Node screen = section.screen();
    if (screen == null || screen.equals(section.plate())) {
      return;
    }
    DcPath path = new DcPaths(point.map(), circuit).to(section, Electrode.SCREEN);
    List<DcStep> steps = WalkBranch.afterSupply(path);
    lines.add(
        steps.isEmpty()
            ? "Screen (" + screen.name() + ") at " + Quantity.volts(point.volts(screen)) + "."
            : "Screen: " + branch.sum(steps));
  }
}
