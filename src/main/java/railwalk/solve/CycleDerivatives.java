package railwalk.solve;

import java.util.List;

/** The derivatives of a {@link CycleSweep} by all its columns, start states first. */
final class CycleDerivatives {
  private final CycleNetwork net;
  private final List<CycleColumn> columns;
  private final int count;
  private final Derivatives derivatives;

  CycleDerivatives(CycleNetwork net, List<CycleColumn> columns) {
    this.net = net;
    this.columns = columns;
    count = columns.size();
    derivatives = new Derivatives(net.stores, net.matrix, count);
  }

  /** Carries the derivatives through one stage that has just been solved. */
  void stage(
      int half,
      double carried,
      double share,
      double stage,
      double perStage,
      double sine,
      double[] x,
      double[] pathAmps) {
    derivatives.stage(
        half,
        carried,
        share,
        stage,
        perStage,
        rightSides -> {
          for (int c = net.stores.size(); c < count; c++) {
            addSource(rightSides, columns.get(c), c, sine, x, pathAmps);
          }
        });
  }

  private void addSource(
      double[] rightSides, CycleColumn by, int c, double sine, double[] x, double[] pathAmps) {
    if (by instanceof CycleColumn.Drawn drawn) {
      add(rightSides, drawn.node(), c, -1);
    } else if (by instanceof CycleColumn.WindingVolts winding) {
      for (Windings.Emf emf : net.emfs) {
        if (emf.winding() != null && emf.winding().name().equals(winding.winding().name())) {
          add(rightSides, emf.branch(), c, emf.peakVolts() * sine);
        }
      }
    } else if (by instanceof CycleColumn.PartOhms part) {
      if (part.branch() >= 0) {
        add(rightSides, part.branch(), c, part.ohms() * x[part.branch()]);
      } else {
        double amps = (DcNetwork.at(x, part.a()) - DcNetwork.at(x, part.b())) / part.ohms();
        add(rightSides, part.a(), c, amps);
        add(rightSides, part.b(), c, -amps);
      }
    } else if (by instanceof CycleColumn.Emission emission) {
      for (int p = 0; p < pathAmps.length; p++) {
        CycleNetwork.Path path = net.paths.get(p);
        if (path.element().equals(emission.element())) {
          add(rightSides, path.anode(), c, -pathAmps[p]);
          add(rightSides, path.cathode(), c, pathAmps[p]);
        }
      }
    }
  }

  private void add(double[] rightSides, int row, int column, double amount) {
    if (row >= 0) {
      rightSides[row * count + column] += amount;
    }
  }

  double[][] endByColumn() {
    return derivatives.endByColumn();
  }

  double[][] meansByColumn() {
    return derivatives.meansByColumn();
  }
}
