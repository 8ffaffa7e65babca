package railwalk.findings;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import railwalk.units.Quantity;

/** Windings against their current, heaters against their volts, choke inputs that run dry. */
final class SupplyParts {
  private SupplyParts() {}

  static Stream<Finding> check(Solved solved) {
    List<Finding> findings = new ArrayList<>();
    for (ChokeInput input : ChokeInput.of(solved.point())) {
      if (input.isBelow()) {
        findings.add(below(solved, input));
      }
    }
    for (WindingDuty duty : WindingDuty.of(solved.point())) {
      if (new Excess(duty.countedAmps(), duty.winding().ratedAmps(), "A", "").is()) {
        findings.add(over(solved, duty));
      }
    }
    for (HeaterDuty duty : HeaterDuty.of(solved.point())) {
      if (duty.isOverheated()) {
        findings.add(hot(solved, duty));
      }
    }
    return findings.stream();
  }

  private static Finding below(Solved solved, ChokeInput input) {
    return FindingCode.CHOKE_INPUT.of(
        solved.scene().words(),
        input.choke().name(),
        input.choke().name()
            + " carries "
            + Quantity.amps(input.drawnAmps())
            + ", below its critical "
            + Quantity.amps(input.criticalAmps())
            + ": the output rises towards the peak");
  }

  private static Finding over(Solved solved, WindingDuty duty) {
    Excess excess = new Excess(duty.countedAmps(), duty.winding().ratedAmps(), "A", "");
    String what =
        duty.tubes().isEmpty()
            ? " carries "
            : " feeds the heaters of " + String.join(" ", duty.tubes()) + " with ";
    return FindingCode.WINDING_CURRENT.of(
        solved.scene().words(),
        duty.winding().name(),
        duty.winding().name() + what + excess.words() + ", rms");
  }

  private static Finding hot(Solved solved, HeaterDuty duty) {
    return FindingCode.HEATER_VOLTS.of(
        solved.scene().words(),
        duty.bottle().name(),
        "the heater of "
            + solved.scene().named(duty.bottle().name(), duty.bottle().name())
            + " gets "
            + new Excess(duty.rmsVolts(), duty.ratedVolts(), "V", "").words());
  }
}
