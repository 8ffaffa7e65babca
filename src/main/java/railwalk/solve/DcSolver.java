package railwalk.solve;

import java.util.List;

/** Brings a {@link DcNetwork} to rest with the supply ports as they are set. */
final class DcSolver {
  private static final List<Strategy> STRATEGIES =
      List.of(new Strategy.Plain(), new Strategy.FadingTies(), new Strategy.RisingSources());

  /** Rounds of lighting and putting out gas tubes before giving up on one that flickers. */
  private static final int MOST_GLOW_ROUNDS = 20;

  private final DcNetwork net;
  private final Trace trace;
  private final Newton newton;

  DcSolver(DcNetwork net, Trace trace) {
    this.net = net;
    this.trace = trace;
    newton = new Newton(net, StepLimit.tubes(4, 100), trace);
  }

  /** Settles from {@code x}; returns false when no strategy did, or a gas tube flickers. */
  boolean settle(double[] x) {
    for (int round = 0; round < MOST_GLOW_ROUNDS; round++) {
      if (!settleOnce(x)) {
        return false;
      }
      if (!net.devices.updateGlow(x)) {
        return true;
      }
      trace.add("a gas tube lights or goes out");
    }
    return false;
  }

  private boolean settleOnce(double[] x) {
    for (Strategy strategy : STRATEGIES) {
      trace.add("%s", strategy.name());
      if (strategy.settle(newton, x)) {
        return true;
      }
    }
    return false;
  }

  Newton newton() {
    return newton;
  }
}
