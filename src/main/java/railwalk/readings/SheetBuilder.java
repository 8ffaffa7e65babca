package railwalk.readings;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import railwalk.circuit.Circuit;
import railwalk.circuit.Winding;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.units.Quantity;

/** Takes rows one after another and says of each bad one why it does not count. */
final class SheetBuilder {
  private static final String METER = "meter";
  private static final List<String> LINE = List.of("line", "mains");

  private static final double LEAST_LINE_VOLTS = 20;
  private static final double MOST_LINE_VOLTS = 600;

  /** How far beyond full scale a meter may still be read, as a share (common practice). */
  private static final double OVERSCALE = 1.25;

  /** What a meter may show where both its leads are on one piece of metal. */
  private static final double NO_VOLTS = 0.05;

  private static final double NO_OHMS = 5;
  private static final double NO_AMPS = 0;

  private static final Pattern WHOLE = Pattern.compile("[-+]?\\d+");
  private static final Pattern DIGITS = Pattern.compile("\\d+");

  /** How the rows come. */
  enum Form {
    SHEET("line"),
    WORDS("word");

    private final String rowWord;

    Form(String rowWord) {
      this.rowWord = rowWord;
    }
  }

  private record Key(MeasuredAt at, ReadingKind kind, String state) {}

  private final Circuit circuit;
  private final Form form;
  private final Separator separator;
  private final PointFinder points;
  private final Placing placing;
  private final StateFinder states;
  private final List<Diagnostic> said = new ArrayList<>();
  private final List<Reading> readings = new ArrayList<>();
  private final Map<Key, Cell> read = new HashMap<>();
  private final Map<String, SourceSpan> settings = new HashMap<>();
  private double lineVolts = Double.NaN;
  private String meter = "";
  private int likeReadings;

  SheetBuilder(Circuit circuit, Form form, Separator separator) {
    this.circuit = circuit;
    this.form = form;
    this.separator = separator;
    this.points = new PointFinder(circuit);
    this.placing = new Placing(circuit);
    this.states = new StateFinder(circuit);
  }

  /** Returns what has been said so far, to add to. */
  List<Diagnostic> said() {
    return said;
  }

  /** Returns whether any row has set something or been read. */
  boolean isEmpty() {
    return readings.isEmpty() && settings.isEmpty();
  }

  /** Returns where the first row that counts stands. */
  Optional<SourceSpan> firstReading() {
    return readings.isEmpty() ? Optional.empty() : Optional.ofNullable(readings.get(0).span());
  }

  /** Returns how many rows had a figure where the volts are. */
  int likeReadings() {
    return likeReadings;
  }

  /** Returns the sheet with all that was said, in file order. */
  SheetReading done() {
    said.sort(Diagnostic.IN_FILE_ORDER);
    return new SheetReading(new ReadingSheet(readings, lineVolts, meter), said);
  }

  /** Takes a row; what was assumed about it is said only if it counts. */
  void take(SheetRow row, Columns columns) {
    if (row.flaw() != null) {
      said.add(row.flaw());
      return;
    }
    if (row.isEmpty()) {
      return;
    }
    List<Diagnostic> notes = new ArrayList<>();
    try {
      read(row, columns, notes);
      said.addAll(notes);
    } catch (RowRefused refused) {
      said.add(refused.diagnostic());
    }
  }

  private void read(SheetRow row, Columns columns, List<Diagnostic> notes) throws RowRefused {
    Cell point = columns.cell(row, Column.POINT);
    Cell value = columns.cell(row, Column.VOLTS);
    likeReadings += FigureReader.isFigure(value.text()) ? 1 : 0;
    if (point.isEmpty()) {
      if (!value.isEmpty()) {
        throw new RowRefused(SheetProblem.POINT_MISSING, value.span());
      }
      return;
    }
    if (form == Form.WORDS && value.isEmpty()) {
      throw new RowRefused(SheetProblem.VALUE_MISSING, point.span(), point.text());
    }
    if (point.text().equalsIgnoreCase(METER)) {
      meter(value, columns.rightOfVolts(row), point);
      return;
    }
    decimalComma(value, columns.besideVolts(row));
    List<Cell> beyond = columns.beyond(row);
    if (!beyond.isEmpty() && !columns.endWithNotes()) {
      Cell first = beyond.get(0);
      throw new RowRefused(
          SheetProblem.CELLS_TOO_MANY, first.span(), first.text(), separator.word());
    }
    Cell state = columns.cell(row, Column.STATE);
    if (LINE.stream().anyMatch(point.text()::equalsIgnoreCase)) {
      line(value, state, point, notes);
      return;
    }
    if (row.cells().size() == 1) {
      alone(point);
      return;
    }
    String note = columns.cell(row, Column.NOTE).text();
    for (Cell cell : beyond) {
      note = note + separator.sign() + " " + cell.text();
    }
    reading(point, value, row, columns, note, notes);
  }

  /** A row of one cell is a point that was not read, or has lost its separator. */
  private void alone(Cell point) throws RowRefused {
    try {
      points.find(point);
    } catch (RowRefused unknown) {
      throw new RowRefused(SheetProblem.SEPARATOR_MISSING, point.span(), separator.word());
    }
  }

  private void decimalComma(Cell value, Optional<Cell> beside) throws RowRefused {
    boolean split =
        separator == Separator.COMMA
            && beside.isPresent()
            && !beside.get().quoted()
            && WHOLE.matcher(value.text()).matches()
            && DIGITS.matcher(beside.get().text()).matches();
    if (split) {
      throw new RowRefused(
          SheetProblem.DECIMAL_COMMA,
          value.span(),
          value.text(),
          beside.get().text(),
          form == Form.SHEET ? "; a note of digits alone goes in quotes" : "");
    }
  }

  private void reading(
      Cell point, Cell value, SheetRow row, Columns columns, String note, List<Diagnostic> notes)
      throws RowRefused {
    Cell kindCell = columns.cell(row, Column.KIND);
    ReadingKind given = kindCell.isEmpty() ? null : KindWords.kind(kindCell);
    if (FigureReader.isNotRead(value.text())) {
      return;
    }
    Point found = points.find(point);
    Figure figure = new FigureReader(separator.decimalComma(), notes).read(value, given);
    ReadingKind kind = figure.kind();
    if (!figure.kindTold()
        && found instanceof Point.OfPart part
        && part.element() instanceof Winding winding) {
      kind = ReadingKind.AC;
      notes.add(SheetProblem.WINDING_TAKEN_AS_AC.at(point.span(), winding.name()));
    }
    boolean signed = kind == ReadingKind.DC || kind == ReadingKind.MA;
    if (figure.amount() < 0 && !signed) {
      throw new RowRefused(SheetProblem.NEGATIVE, value.span(), value.text(), kind.word());
    }
    MeasuredAt at = placing.at(found, kind, point, notes);
    String state = states.state(columns.cell(row, Column.STATE), kind);
    double rangeVolts = range(columns.cell(row, Column.RANGE), kind, figure.amount(), notes);
    if (isOnReference(at, found, kind, figure.amount(), point, value, notes)) {
      return;
    }
    Cell first = read.putIfAbsent(new Key(at, kind, state), point);
    if (first != null) {
      boolean sameWord = first.text().equalsIgnoreCase(point.text());
      throw new RowRefused(
          SheetProblem.READ_TWICE,
          point.span(),
          point.text(),
          first.span().line(),
          sameWord ? "" : ", as " + first.text(),
          form.rowWord);
    }
    readings.add(
        new Reading(
            point.text(), at, kind, figure.amount(), state, rangeVolts, note, point.span()));
  }

  /** Returns whether a reading is of the reference itself and shows the nothing it should. */
  private boolean isOnReference(
      MeasuredAt at,
      Point found,
      ReadingKind kind,
      double amount,
      Cell point,
      Cell value,
      List<Diagnostic> notes)
      throws RowRefused {
    if (!(at instanceof MeasuredAt.AtNode place) || !place.node().equals(circuit.reference())) {
      return false;
    }
    if (found instanceof Point.OfNode) {
      throw new RowRefused(SheetProblem.REFERENCE_POINT, point.span(), point.text());
    }
    double most =
        switch (kind) {
          case DC, AC, RIPPLE -> NO_VOLTS;
          case OHMS -> NO_OHMS;
          case MA -> NO_AMPS;
        };
    if (Math.abs(amount) > most) {
      throw new RowRefused(
          SheetProblem.REFERENCE_NOT_ZERO, point.span(), point.text(), value.text());
    }
    notes.add(SheetProblem.REFERENCE_READ.at(point.span(), point.text()));
    return true;
  }

  private double range(Cell cell, ReadingKind kind, double amount, List<Diagnostic> notes)
      throws RowRefused {
    if (FigureReader.isNotRead(cell.text()) || cell.text().equalsIgnoreCase("auto")) {
      return Double.NaN;
    }
    if (kind == ReadingKind.OHMS || kind == ReadingKind.MA) {
      notes.add(SheetProblem.RANGE_NOT_USED.at(cell.span(), kind.word()));
      return Double.NaN;
    }
    FigureReader figures = new FigureReader(separator.decimalComma(), notes);
    double volts;
    try {
      volts = figures.read(cell, kind).amount();
    } catch (RowRefused refused) {
      throw new RowRefused(SheetProblem.RANGE_BAD, cell.span(), cell.text());
    }
    if (!(volts > 0)) {
      throw new RowRefused(SheetProblem.RANGE_BAD, cell.span(), cell.text());
    }
    if (Math.abs(amount) > OVERSCALE * volts) {
      throw new RowRefused(
          SheetProblem.RANGE_TOO_LOW, cell.span(), Quantity.volts(amount), Quantity.volts(volts));
    }
    return volts;
  }

  private void meter(Cell value, List<Cell> right, Cell point) throws RowRefused {
    if (value.isEmpty()) {
      return;
    }
    once(METER, point);
    String ranges =
        right.stream()
            .map(Cell::text)
            .filter(FigureReader::isFigure)
            .map(range -> " " + range)
            .collect(Collectors.joining());
    meter = value.text() + ranges;
  }

  private void line(Cell value, Cell state, Cell point, List<Diagnostic> notes) throws RowRefused {
    if (FigureReader.isNotRead(value.text())) {
      return;
    }
    FigureReader figures = new FigureReader(separator.decimalComma(), notes);
    double volts = figures.read(value, ReadingKind.AC).amount();
    if (!(volts >= LEAST_LINE_VOLTS && volts <= MOST_LINE_VOLTS)) {
      throw new RowRefused(SheetProblem.LINE_OUT_OF_RANGE, value.span(), value.text());
    }
    if (!state.isEmpty()) {
      throw new RowRefused(SheetProblem.LINE_STATE, state.span(), state.text());
    }
    once(LINE.get(0), point);
    lineVolts = volts;
  }

  private void once(String setting, Cell point) throws RowRefused {
    SourceSpan first = settings.putIfAbsent(setting, point.span());
    if (first != null) {
      throw new RowRefused(
          SheetProblem.SETTING_TWICE, point.span(), setting, first.line(), form.rowWord);
    }
  }
}
