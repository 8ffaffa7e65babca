package railwalk.readings;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import railwalk.circuit.Circuit;
import railwalk.circuit.Element;
import railwalk.circuit.Node;
import railwalk.circuit.Winding;
import railwalk.device.Electrode;
import railwalk.source.Diagnostic;
import railwalk.source.DiagnosticPrinter;
import railwalk.source.SourceSpan;

/** What a sheet holds and what is made of it, on the netlists of the demos. */
class SheetReaderTest {
  private static final Circuit MILLRACE = Amps.millrace();

  private static SheetReading read(String text) {
    return SheetReader.read("sheet.csv", text, MILLRACE);
  }

  /** Returns the readings of a sheet of which nothing at all is to be said. */
  private static List<Reading> clean(String text) {
    SheetReading read = read(text);
    assertThat(DiagnosticPrinter.print(read.diagnostics())).isEmpty();
    return read.sheet().readings();
  }

  private static Reading only(String row) {
    List<Reading> readings = clean("point,volts,kind,state,range,note\n" + row + "\n");
    assertThat(readings).hasSize(1);
    return readings.get(0);
  }

  private static List<String> codes(SheetReading reading) {
    return reading.diagnostics().stream().map(Diagnostic::code).toList();
  }

  /** Returns {@code reading} as if typed in a form. */
  private static Reading unplaced(Reading reading) {
    return new Reading(
        reading.point(),
        reading.at(),
        reading.kind(),
        reading.value(),
        reading.state(),
        reading.rangeVolts(),
        reading.note(),
        null);
  }

  private static SourceSpan place(@Nullable SourceSpan span) {
    return Objects.requireNonNull(span, "no place");
  }

  private static MeasuredAt node(String name) {
    return new MeasuredAt.AtNode(MILLRACE.node(name).orElseThrow());
  }

  private static Element part(String name) {
    return MILLRACE.element(name).orElseThrow();
  }

  /** Of RFC 4180 (2005), section 2, rules 1 to 7, each in turn. */
  @Test
  void cellsAreThoseOfRfc4180() {
    List<Reading> crlf = clean("point,volts\r\nb1,452\r\nb2,440\r\n");
    assertThat(crlf).extracting(Reading::value).containsExactly(452.0, 440.0);
    List<Reading> unended = clean("point,volts\r\nb1,452\r\nb2,440");
    assertThat(unended.stream().map(SheetReaderTest::unplaced).toList())
        .isEqualTo(crlf.stream().map(SheetReaderTest::unplaced).toList());
    assertThat(clean("volts,point\r\n452,b1\r\n440,b2\r\n"))
        .extracting(Reading::value)
        .containsExactly(452.0, 440.0);
    assertThat(only("b1,452,,,,before the choke").note()).isEqualTo("before the choke");
    assertThat(unplaced(only("\"b1\",\"452\",\"\",\"\",\"\",\"hot\"")))
        .isEqualTo(unplaced(only("b1,452,,,,hot")));
    Reading lines = only("b1,452,,,,\"hot, after\r\nan hour\"");
    assertThat(lines.note()).isEqualTo("hot, after\nan hour");
    assertThat(only("b1,452,,,,\"the \"\"hot\"\" end\"").note()).isEqualTo("the \"hot\" end");
  }

  @Test
  void rowsAfterACellOverSeveralLinesKeepTheirPlace() {
    SheetReading read = read("point,volts,note\nb1,452,\"one\ntwo\"\nb2,440,\nb77,1,\n");
    assertThat(read.sheet().readings()).hasSize(2);
    assertThat(place(read.sheet().readings().get(1).span()).line()).isEqualTo(4);
    assertThat(read.diagnostics()).hasSize(1);
    assertThat(place(read.diagnostics().get(0).span()).line()).isEqualTo(5);
  }

  @Test
  void anOpenQuoteCostsItsOwnRowOnly() {
    SheetReading read = read("point,volts,note\nb1,452,\"open\nb2,440,\"hot\"\nb3,400,\n");
    assertThat(codes(read)).containsExactly("quote-open");
    assertThat(read.sheet().readings()).extracting(Reading::point).containsExactly("b2", "b3");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "\ufeffpoint,volts\nb1,452.5\nR2,9\n",
        "POINT;Volts (V)\nb1;452,5\nR2;9\n",
        "point\tvolts\nb1\t452.5\nR2\t9\n",
        "point\tvolts\nb1\t452,5 V\nR2\t9\n",
        "# bench, Tuesday\n\n* hot\npoint , volts\n\n b1 , 452.5 V \n,\n R2 , 9\n",
        "point,volts,,,\nb1,452.5,,,\nR2,9,,,\n,,,,\n",
        "point;volts;kind;note\nb1;0,4525kV;;\nR2;9000 mV;dc;\n",
        "note,kind,volts,point\n,,452.5,b1\n,,9,R2\n",
        "point,volts\r\nb1,+452.5\r\nR2,9\r\nb2,\r\nb3,-\r\nb4,?\r\nb99,\r\n",
        "point,volts\rb1,452.5\rR2,9",
        "Test point,Reading [V]\nB1,452.5\u00a0V\nr2,9",
        "point,volts\nXS1,\nb1,452.5vdc\nR2,9 V DC"
      })
  void oneSheetInManyForms(String text) {
    List<Reading> readings = clean(text);
    assertThat(readings).hasSize(2);
    assertThat(readings.get(0).at()).isEqualTo(node("b1"));
    assertThat(readings.get(0).value()).isCloseTo(452.5, within(1e-9));
    Node b2 = MILLRACE.node("b2").orElseThrow();
    Node b3 = MILLRACE.node("b3").orElseThrow();
    assertThat(readings.get(1).at()).isEqualTo(new MeasuredAt.Across(part("R2"), b2, b3));
    assertThat(readings.get(1).value()).isCloseTo(9, within(1e-9));
    assertThat(readings).extracting(Reading::kind).containsOnly(ReadingKind.DC);
    assertThat(readings).extracting(Reading::state).containsOnly("");
    assertThat(readings).extracting(Reading::rangeVolts).containsOnly(Double.NaN);
  }

  @Test
  void withoutAHeaderTheUsualOrderIsTaken() {
    SheetReading read = read("b1,452\nb2,440,dc,standby,500,hot\n");
    assertThat(codes(read)).containsExactly("header-missing");
    Reading second = read.sheet().readings().get(1);
    assertThat(second.state()).isEqualTo("standby");
    assertThat(second.rangeVolts()).isEqualTo(500);
    assertThat(second.note()).isEqualTo("hot");
    assertThat(codes(read("b1;452,5\n"))).containsExactly("header-missing");
    assertThat(read("b1;452,5\n").sheet().readings().get(0).value()).isEqualTo(452.5);
  }

  @Test
  void conditionsMayStandAnywhere() {
    SheetReading read = read("line,118\nmeter,20k/V,50,250,500\npoint,volts\nb1,452\n");
    assertThat(read.diagnostics()).isEmpty();
    assertThat(read.sheet().lineVolts()).isEqualTo(118);
    assertThat(read.sheet().meter()).isEqualTo("20k/V 50 250 500");
    SheetReading later = read("point;volts;note\nb1;452;\nMains;117,5 V;by the wall\nMETER;10M;\n");
    assertThat(later.diagnostics()).isEmpty();
    assertThat(later.sheet().lineVolts()).isEqualTo(117.5);
    assertThat(later.sheet().meter()).isEqualTo("10M");
    SheetReading none = read("point,volts\nline,\nmeter,\nb1,452\n");
    assertThat(none.diagnostics()).isEmpty();
    assertThat(none.sheet().lineVolts()).isNaN();
    assertThat(none.sheet().meter()).isEmpty();
  }

  @ParameterizedTest
  @CsvSource({
    "V1.6, p1b",
    "v1.1, p1a",
    "XV1.6, p1b",
    "V1B.6, p1b",
    "V1A.plate, p1a",
    "V1b.anode, p1b",
    "V1A.g1, g1a",
    "V3.k, kp",
    "V4.screen, s4",
    "V4.g2, s4",
    "V4.g1, g4s",
    "V4.k, k4",
    "V4.8, k4",
    "V6.cathode, b0",
    "V6.8, b0",
    "V6.plate1, ht1",
    "V6.a2, ht2",
    "V4.g3, k4",
    "V5.h1, h1",
    "node:v1, v1",
    "NODE: V2, v2",
    "BIAS, bias"
  })
  void pinsElectrodesAndNodesAreNodes(String point, String node) {
    assertThat(only(point + ",12").at()).isEqualTo(node(node));
  }

  /** A filament is the cathode of a directly heated tube, and only its ends can be touched. */
  @Test
  void aFilamentIsReadAtItsEnd() {
    Circuit first = Amps.of("amps/first.cir");
    SheetReading read = SheetReader.read("s.csv", "point,volts\nV2.cathode,330\n", first);
    assertThat(read.diagnostics()).isEmpty();
    MeasuredAt end = new MeasuredAt.AtNode(first.node("b1").orElseThrow());
    assertThat(read.sheet().readings().get(0).at()).isEqualTo(end);
  }

  @Test
  void electrodesWithoutAWireAreNoPoints() {
    Circuit first = Amps.of("amps/first.cir");
    SheetReading read =
        SheetReader.read("s.csv", "point,volts\nV1B.plate,1\nV1.h1,1\nV1.6,3\n", first);
    assertThat(codes(read))
        .containsExactly("electrode-not-in-tube", "electrode-not-in-tube", "pin-not-wired");
    assertThat(read.diagnostics().get(2).hint()).isEqualTo("its wired pins: 1, 2, 3");
  }

  @Test
  void partsAreReadAcrossOrInSeries() {
    Node b1 = MILLRACE.node("b1").orElseThrow();
    Node bo = MILLRACE.node("bo").orElseThrow();
    assertThat(only("XF1,0.1").at()).isEqualTo(new MeasuredAt.Across(part("F1"), b1, bo));
    Node n1 = MILLRACE.node("n1").orElseThrow();
    Node n2 = MILLRACE.node("n2").orElseThrow();
    assertThat(only("P1,21").at()).isEqualTo(new MeasuredAt.Across(part("P1"), n1, n2));
    Reading current = only("R38,35,ma");
    assertThat(current.at()).isEqualTo(new MeasuredAt.Through(part("R38"), null));
    assertThat(current.value()).isCloseTo(0.035, within(1e-12));
    Reading cathode = only("V4.k,35 mA");
    assertThat(cathode.kind()).isEqualTo(ReadingKind.MA);
    assertThat(cathode.at()).isEqualTo(new MeasuredAt.Through(part("V4"), Electrode.CATHODE));
    assertThat(only("V3A.cathode,1.1,ma").at())
        .isEqualTo(new MeasuredAt.Through(part("V3A"), Electrode.CATHODE));
    assertThat(only("V4.3,0.035A").value()).isCloseTo(0.035, within(1e-12));
    assertThat(only("V4.5,900nA").value()).isCloseTo(9e-7, within(1e-15));
  }

  @Test
  void ohmsAndRippleAreAgainstTheReference() {
    Reading cathode = only("R16,1480,ohms");
    assertThat(cathode.at()).isEqualTo(node("k1a"));
    assertThat(cathode.value()).isEqualTo(1480);
    assertThat(only("V1.6,OL,ohms").value()).isEqualTo(Double.POSITIVE_INFINITY);
    assertThat(only("V1.6,open,ohms,tubes out").state()).isEmpty();
    assertThat(only("C3,1.2,ripple").at()).isEqualTo(node("b2"));
    assertThat(only("V4.5,-44,dc,v4 pulled").state()).isEqualTo(Reading.pulled("V4"));
    assertThat(only("V1.6,0.2 Vrms,ripple").kind()).isEqualTo(ReadingKind.RIPPLE);
  }

  @Test
  void windingsAreReadInAc() {
    MeasuredAt high = new MeasuredAt.OnWinding((Winding) part("VHT"));
    assertThat(only("VHT,702,ac").at()).isEqualTo(high);
    assertThat(only("VHT,702 VAC").at()).isEqualTo(high);
    assertThat(only("VHT,702 V~").kind()).isEqualTo(ReadingKind.AC);
    assertThat(only("ht1,351,ac").at()).isEqualTo(node("ht1"));
    assertThat(only("V6.4,351,ac").at()).isEqualTo(node("ht1"));
    SheetReading heaters = read("point,volts,kind\nV1.9,6.4,ac\nV6.2,5.1,ac\n");
    assertThat(codes(heaters)).containsExactly("heater-on-winding", "heater-on-winding");
    assertThat(heaters.sheet().readings())
        .extracting(Reading::at)
        .containsExactly(
            new MeasuredAt.OnWinding((Winding) part("VH")),
            new MeasuredAt.OnWinding((Winding) part("VFR")));
  }

  @ParameterizedTest
  @CsvSource({
    "352, dc, 352",
    "352V, dc, 352",
    "0.35k, dc, 350",
    "1.2 kV, dc, 1200",
    "-42 V, dc, -42",
    "\u221242, dc, -42",
    "\u201342 V, dc, -42",
    "350 mV, dc, 0.35",
    "350 \u00b5V, dc, 0.00035",
    ".5, dc, 0.5",
    "4.5e2, dc, 450",
    "35mA, ma, 0.035",
    "1.2A, ma, 1.2",
    "470R, ohms, 470",
    "4R7, ohms, 4.7",
    "1.5kohm, ohms, 1500",
    "2.2 M\u03a9, ohms, 2200000",
    "1.5k\u2126, ohms, 1500",
    "OL ohm, ohms, Infinity",
    "OL M\u03a9, ohms, Infinity",
    "6.3 V AC, ac, 6.3"
  })
  void theUnitTellsTheKind(String value, String kind, double amount) {
    boolean current = kind.equals("ma");
    Reading reading = only((current ? "R38," : "b1,") + value);
    assertThat(reading.kind().word()).isEqualTo(kind);
    if (Double.isInfinite(amount)) {
      assertThat(reading.value()).isEqualTo(amount);
    } else {
      assertThat(reading.value()).isCloseTo(amount, within(1e-9 * Math.abs(amount)));
    }
  }

  @ParameterizedTest
  @CsvSource({"1k5, 1500", "100k, 100000", "2.2M, 2200000", "0, 0", "4K7, 4700", "inf, Infinity"})
  void ohmsAreReadAsPartsAreMarked(String value, double ohms) {
    assertThat(only("b1," + value + ",ohms").value()).isEqualTo(ohms);
  }

  @ParameterizedTest
  @ValueSource(strings = {"12k", "8k2", "2.2M", "35m", "1meg", "-5k"})
  void aPrefixAloneThatFitsOhmsTooIsAskedAbout(String value) {
    assertThat(codes(read("point,volts\nb1," + value + "\n"))).containsExactly("unit-needed");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "abc",
        "12p",
        "1 2 3",
        "3.4.5",
        "12 volts or so",
        ">400",
        "V",
        "1/2",
        "5H",
        "0x10"
      })
  void whatIsNoFigureIsSaid(String value) {
    assertThat(codes(read("point,volts\nb1," + value + "\n"))).containsExactly("not-a-value");
  }

  @Test
  void statesAreFoundByTheirNamesInAnyCase() {
    assertThat(only("b1,0,,STANDBY").state()).isEqualTo("standby");
    assertThat(only("b1,430,,Other rectifier").state()).isEqualTo("other_rectifier");
    assertThat(only("b1,480,,Tubes Out").state()).isEqualTo(Reading.TUBES_OUT);
    assertThat(only("b1,480,,valves out").state()).isEqualTo(Reading.TUBES_OUT);
  }

  @Test
  void onePlaceIsReadOnceForEachKindAndState() {
    SheetReading read =
        read(
            """
            point,volts,kind,state
            V1.1,168
            V1A.plate,169
            p1a,170,,standby
            p1a,1M,ohms
            node:P1A,171
            """);
    assertThat(codes(read)).containsExactly("read-twice", "read-twice");
    assertThat(read.diagnostics().get(0).message())
        .isEqualTo("V1A.plate is read on line 2 already, as V1.1");
    assertThat(read.sheet().readings())
        .extracting(Reading::value)
        .containsExactly(168.0, 170.0, 1e6);
  }

  /** The chassis of the demo without a transformer is a node of its own beside the reference. */
  @Test
  void theReferenceIsNoPoint() {
    Circuit towpath = Amps.towpath();
    String text = "point,volts\nbm,0\nchassis,0.4\nV1.2,0\nV1.3,12\n";
    SheetReading read = SheetReader.read("s.csv", text, towpath);
    assertThat(codes(read))
        .containsExactly("reference-point", "reference-read", "reference-not-zero");
    assertThat(read.sheet().readings()).extracting(Reading::point).containsExactly("chassis");
    assertThat(codes(read("point,volts\nground,0\nchassis,0\nGND,0\n")))
        .containsOnly("reference-point");
  }

  @Test
  void errorsPointAtTheirCell() {
    SheetReading read = read("point,volts,kind\n  b1 , 452 ,\tpeek\n");
    SourceSpan span = place(read.diagnostics().get(0).span());
    assertThat(List.of(span.line(), span.column(), span.length())).isEqualTo(List.of(2, 14, 4));
  }

  @Test
  void aRangeThatDoesNotReachIsASlip() {
    assertThat(only("b1,452,,,500").rangeVolts()).isEqualTo(500);
    assertThat(only("b1,-42,,,50 V").rangeVolts()).isEqualTo(50);
    assertThat(codes(read("point,volts,range\nb1,452,5\n"))).containsExactly("range-too-low");
  }

  @Test
  void aRowWithoutItsSeparatorIsNotTakenForABlankOne() {
    assertThat(codes(read("point,volts\nb1,452\nV1.6\nV1.6 171\n")))
        .containsExactly("separator-missing");
  }

  @Test
  void aFigureInTheWrongColumnIsNotPassedOver() {
    SheetReading read = read("point,volts,kind\nb1,,452\n");
    assertThat(codes(read)).containsExactly("kind-unknown");
  }

  @Test
  void wordsOfTheCommandLine() {
    SheetReading read =
        SheetReader.ofWords(
            Arrays.asList(
                "b1=452",
                "V1.6=171V",
                "V4.k=35mA",
                "R38=35mV",
                "R16=1.5kohm",
                "VHT=702",
                "b2=1.2,ripple",
                "b2=470,dc,standby",
                "node:v1=0.1",
                "line=118",
                "meter=20k/V 50 250"),
            MILLRACE);
    assertThat(codes(read)).containsExactly("winding-taken-as-ac");
    assertThat(read.sheet().lineVolts()).isEqualTo(118);
    assertThat(read.sheet().meter()).isEqualTo("20k/V 50 250");
    assertThat(read.sheet().readings())
        .extracting(Reading::kind)
        .containsExactly(
            ReadingKind.DC,
            ReadingKind.DC,
            ReadingKind.MA,
            ReadingKind.DC,
            ReadingKind.OHMS,
            ReadingKind.AC,
            ReadingKind.RIPPLE,
            ReadingKind.DC,
            ReadingKind.DC);
    assertThat(read.sheet().readings().get(7).state()).isEqualTo("standby");
    assertThat(SheetReader.ofWords(List.of(), MILLRACE).sheet().readings()).isEmpty();
  }

  @ParameterizedTest
  @CsvSource({
    "'%PDF-1.7\n...', not-a-sheet",
    "'\u0089PNG\r\n', not-a-sheet",
    "'<html><body></body></html>', not-a-sheet",
    "'b1,45\u00002', not-a-sheet",
    "'', sheet-empty",
    "'\ufeff \n\t\n', sheet-empty",
    "'# only a remark\n', nothing-filled-in",
    "'point,volts\n', nothing-filled-in",
    "'line,118\n', nothing-filled-in",
    "'Dear sir,\nhere are my readings.\nYours, the bench\n', no-row-readable"
  })
  void whatIsNoSheetGetsOneError(String text, String code) {
    SheetReading read = SheetReader.read("x", text == null ? "" : text, MILLRACE);
    assertThat(codes(read)).containsExactly(code);
    assertThat(read.diagnostics().get(0).isError()).isTrue();
  }
}
