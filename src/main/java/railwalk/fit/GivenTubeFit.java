package railwalk.fit;

import java.util.ArrayList;
import java.util.List;
import org.hipparchus.exception.MathRuntimeException;
import org.jspecify.annotations.Nullable;
import railwalk.device.AmplifierLaw;
import railwalk.device.DataFile;
import railwalk.device.LikeSections;
import railwalk.device.PublishedPoint;
import railwalk.device.SectionType;

/**
 * Makes the laws of a type that a netlist brings along from the points given there. Where it names
 * a type that it is like, that type's constants stand behind the points in place of the family's.
 */
public final class GivenTubeFit {
  private GivenTubeFit() {}

  /**
   * Returns {@code file} with the constants of all its laws.
   *
   * @throws IllegalArgumentException when no law comes near the points
   */
  public static DataFile fitted(DataFile file) {
    List<LikeSections> groups = file.likeSections();
    List<String> lines = new ArrayList<>();
    for (LikeSections group : groups) {
      long alike = groups.stream().filter(g -> g.kind().equals(group.kind())).count();
      String section = alike == 1 ? "" : " section=" + group.first();
      lines.add("fit      " + group.kind() + section + constants(file, group));
    }
    return file.with(lines);
  }

  private static String constants(DataFile file, LikeSections group) {
    List<PublishedPoint> points = file.points(group);
    if (!group.amplify()) {
      return TubeFit.constants(group.kind(), points);
    }
    Curve family = Curve.named(group.kind());
    AmplifierLaw kin = kin(file, group);
    Curve curve = kin == null ? family : Kinship.around(family, kin);
    try {
      return curve.words(LeastSquaresFit.constants(curve, points));
    } catch (MathRuntimeException failure) {
      throw new IllegalArgumentException("no " + group.kind() + " has such points", failure);
    }
  }

  /** Returns the law of the same section, or kind of section, of the type it is like. */
  private static @Nullable AmplifierLaw kin(DataFile file, LikeSections group) {
    DataFile like = file.like().orElse(null);
    if (like == null) {
      return null;
    }
    for (LikeSections other : like.likeSections()) {
      if (other.kind().equals(group.kind())) {
        return like.type()
            .section(other.first())
            .map(SectionType::law)
            .map(AmplifierLaw.class::cast)
            .orElse(null);
      }
    }
    return null;
  }
}
