package railwalk.chart;

import railwalk.circuit.Switch;

/** Says what position a switch is in. */
final class SwitchWords {
  private SwitchWords() {}

  /** Returns "open", "closed" or "position 2 of 3". */
  static String position(Switch contact) {
    return position(contact, contact.position());
  }

  /** Returns the words for {@code position} of that switch. */
  static String position(Switch contact, int position) {
    if (position == 0) {
      return "open";
    }
    return contact.poles().size() == 1
        ? "closed"
        : "position " + position + " of " + contact.poles().size();
  }

  /** Returns position and what it joins: "closed, joins b1 to b2". */
  static String joined(Switch contact) {
    if (contact.position() == 0) {
      return position(contact);
    }
    return position(contact)
        + ", joins "
        + contact.common().name()
        + " to "
        + contact.poles().get(contact.position() - 1).name();
  }
}
