package railwalk.netlist;

import java.util.HashMap;
import java.util.HashSet;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;

/**
 * Named parameters, of the whole netlist or of one use of a sub-circuit. A parameter is worked out
 * when it is first asked for, so its definition may stand before or after its use.
 */
final class Scope {
  /** Parameters that hang one on another further than this are a mistake. */
  private static final int DEEPEST = 50;

  private final @Nullable Scope outer;
  private final Values values;
  private final Map<String, Definition> definitions = new HashMap<>();
  private final Map<String, Double> known = new HashMap<>();
  private final Set<String> beingRead = new HashSet<>();

  private record Definition(Word value, Scope readIn) {}

  /** The outermost scope. */
  Scope(Values values) {
    this(null, values);
  }

  private Scope(@Nullable Scope outer, Values values) {
    this.outer = outer;
    this.values = values;
  }

  /** Returns a scope inside this one. */
  Scope inner() {
    return new Scope(this, values);
  }

  /** Defines {@code name}; its value is read with the names of {@code readIn}. */
  void define(String name, Word value, Scope readIn) {
    definitions.put(key(name), new Definition(value, readIn));
  }

  /** Returns whether {@code name} is a parameter here. */
  boolean knows(String name) {
    return definitions.containsKey(key(name)) || (outer != null && outer.knows(name));
  }

  /** Returns the parameter names that can be used here, in alphabetical order. */
  Set<String> names() {
    Set<String> names = new TreeSet<>(definitions.keySet());
    if (outer != null) {
      names.addAll(outer.names());
    }
    return names;
  }

  /**
   * Returns the value of a parameter that this scope knows; NaN when it cannot be worked out, which
   * is then reported.
   *
   * @param use where its name stands
   */
  double value(String name, Word use) {
    String key = key(name);
    Definition definition = definitions.get(key);
    if (definition == null) {
      return outer == null ? Double.NaN : outer.value(name, use);
    }
    Double value = known.get(key);
    if (value != null) {
      return value;
    }
    if (beingRead.size() >= DEEPEST || !beingRead.add(key)) {
      values.report().add(Problem.PARAMETER_CIRCLE, use.span(), name);
      return Double.NaN;
    }
    double read = values.number(definition.value(), definition.readIn());
    beingRead.remove(key);
    known.put(key, read);
    return read;
  }

  private static String key(String name) {
    return name.toLowerCase(Locale.ROOT);
  }
}
