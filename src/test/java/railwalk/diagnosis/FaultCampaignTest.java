package railwalk.diagnosis;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * How often the part at fault is named, over random faults in random builds of the demo amplifiers.
 * Limits: this project's own goals; the builds are drawn independently of the diagnosis, from the
 * makers' and usual tolerances of the netlist.
 */
class FaultCampaignTest {
  private static final List<String> AMPS = List.of("lockgate", "millrace", "towpath", "weirside");

  /** What a run came to. */
  private record Score(int cases, int first, int inThree, int groupSizes, int healthy, int fine) {
    double share(int of) {
      return (double) of / cases;
    }
  }

  @Test
  void faultsAreNamed() throws Exception {
    Score score = run(15, 5, 1);
    assertThat(score.share(score.first)).isGreaterThanOrEqualTo(0.85);
    assertThat(score.share(score.inThree)).isGreaterThanOrEqualTo(0.95);
    assertThat((double) score.groupSizes / score.inThree).isLessThanOrEqualTo(4);
    assertThat((double) score.fine / score.healthy).isGreaterThanOrEqualTo(0.9);
  }

  @Test
  @Tag("slow")
  void longRunNamesFaults() throws Exception {
    Score score = run(250, 100, 2);
    assertThat(score.share(score.first)).isGreaterThanOrEqualTo(0.85);
    assertThat(score.share(score.inThree)).isGreaterThanOrEqualTo(0.97);
    assertThat((double) score.groupSizes / score.inThree).isLessThanOrEqualTo(4);
    assertThat((double) score.fine / score.healthy).isGreaterThanOrEqualTo(0.95);
  }

  private static Score run(int casesEach, int healthyEach, long seed) throws Exception {
    int cases = 0;
    int first = 0;
    int inThree = 0;
    int sizes = 0;
    int fine = 0;
    for (String amp : AMPS) {
      FaultCampaign campaign = new FaultCampaign(Path.of("test-netlists", "amps", amp + ".cir"));
      Random random = new Random(seed);
      int own = 0;
      int ownFirst = 0;
      int ownThree = 0;
      int ownFine = 0;
      for (int i = 0; i < healthyEach; i++) {
        double[] read = campaign.readHealthy(random).orElseThrow();
        ownFine += campaign.diagnose(read, campaign.all()).healthy() ? 1 : 0;
      }
      while (own < casesEach) {
        Fault fault = campaign.faults.get(random.nextInt(campaign.faults.size()));
        double severity = FaultCampaign.severity(fault, random);
        if (!campaign.shows(fault, severity)) {
          continue;
        }
        double[] read = campaign.read(fault, severity, random).orElse(null);
        if (read == null) {
          continue;
        }
        FaultCampaign.Outcome outcome =
            campaign.outcome(fault, severity, campaign.diagnose(read, campaign.all()));
        own++;
        ownFirst += outcome.place() == 1 ? 1 : 0;
        ownThree += outcome.place() <= 3 ? 1 : 0;
        sizes += outcome.place() <= 3 ? outcome.groupSize() : 0;
        if (outcome.place() > 1) {
          System.out.printf(
              Locale.ROOT,
              "  %s %s %s %.3g: place %d%n",
              fault.element(),
              fault.kind().word(),
              fault.detail(),
              severity,
              outcome.place());
        }
      }
      System.out.printf(
          Locale.ROOT,
          "%s: first %d, in the first three %d of %d; healthy called healthy %d of %d%n",
          amp,
          ownFirst,
          ownThree,
          own,
          ownFine,
          healthyEach);
      cases += own;
      first += ownFirst;
      inThree += ownThree;
      fine += ownFine;
    }
    System.out.printf(
        Locale.ROOT,
        "all: first %.1f %%, in the first three %.1f %% of %d, mean group %.2f; healthy %d of %d%n",
        100.0 * first / cases,
        100.0 * inThree / cases,
        cases,
        (double) sizes / inThree,
        fine,
        healthyEach * AMPS.size());
    return new Score(cases, first, inThree, sizes, healthyEach * AMPS.size(), fine);
  }

  /** Places drawn at random, without repeats. */
  static List<Integer> some(List<Integer> all, int count, Random random) {
    List<Integer> shuffled = new ArrayList<>(all);
    Collections.shuffle(shuffled, random);
    return shuffled.subList(0, Math.min(count, shuffled.size()));
  }
}
