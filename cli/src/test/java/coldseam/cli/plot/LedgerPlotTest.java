package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Gain;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Meters;
import coldseam.solver.ledger.Supply;
import coldseam.solver.ledger.Uncertain;
import coldseam.solver.ledger.Utilisation;
import java.awt.geom.FlatteningPathIterator;
import java.awt.geom.PathIterator;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.batik.parser.AWTPathProducer;
import org.apache.batik.parser.PathParser;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/** The figure of a ledger, read back from its SVG. */
class LedgerPlotTest {
  private static final Uncertain ONE = Uncertain.exact(1);

  private static Envelope.Part part(Envelope.Kind kind, String name, double h) {
    return new Envelope.Part(kind, name, h, ONE, "", ONE, "");
  }

  private static Climate climate() {
    return new Climate(
        20,
        List.of(Climate.step("period", 100, 20, 0, OptionalDouble.of(10))),
        OptionalDouble.empty());
  }

  private static Ledger designed(List<Envelope.Part> parts) {
    return Ledger.designed(
        new Envelope(parts),
        climate(),
        List.of(new Gain("sun", List.of(900.0))),
        new Utilisation.Stated(1),
        0,
        new Supply.HeatPump(3));
  }

  /** Height of each filled band where it meets the bar, points. */
  private static List<Double> heights(Read plot, String layer) {
    NodeList paths = plot.layers("ledger-" + layer).get(0).getElementsByTagName("path");
    List<Double> heights = new ArrayList<>();
    for (int i = 0; i < paths.getLength(); i++) {
      Element path = (Element) paths.item(i);
      if (!path.getAttribute("fill").equals("none")) {
        heights.add(atTheBar(path.getAttribute("d")));
      }
    }
    return heights;
  }

  /** A band begins and ends at the bar, one point above the other. */
  private static double atTheBar(String data) {
    AWTPathProducer shape = new AWTPathProducer();
    PathParser parser = new PathParser();
    parser.setPathHandler(shape);
    parser.parse(data);
    PathIterator points = new FlatteningPathIterator(shape.getShape().getPathIterator(null), 0.1);
    double[] at = new double[2];
    points.currentSegment(at);
    double x = at[0];
    double first = at[1];
    double far = first;
    for (; !points.isDone(); points.next()) {
      boolean line = points.currentSegment(at) == PathIterator.SEG_LINETO;
      far = line && Math.abs(at[0] - x) < 0.02 ? Math.max(far, at[1]) : far;
    }
    return far - first;
  }

  /** Everything in and everything out at one scale: 48 kWh for each W/K over 100 days of 20 K. */
  @Test
  void widths_are_to_scale() {
    Ledger ledger =
        designed(
            List.of(
                part(Envelope.Kind.ELEMENT, "wall", 60),
                part(Envelope.Kind.JUNCTION, "edge", 15),
                part(Envelope.Kind.JUNCTION, "eaves", -5 * -1),
                part(Envelope.Kind.AIR, "air change", 20)));
    Read plot = Read.of(new LedgerPlot("House", ledger).svg());
    List<Double> in = heights(plot, "in");
    List<Double> out = heights(plot, "out");
    double[] comesIn = {900, 3900 / 3.0, 3900 * 2 / 3.0};
    double[] goesOut = {2880, 960, 960};
    double scale = sum(in) / 4800;
    assertThat(in).hasSize(3);
    assertThat(out).hasSize(3);
    assertThat(sum(out)).isCloseTo(sum(in), within(0.1));
    for (int i = 0; i < 3; i++) {
      assertThat(in.get(i)).isCloseTo(scale * comesIn[i], within(0.05));
      assertThat(out.get(i)).isCloseTo(scale * goesOut[i], within(0.05));
    }
    assertThat(plot.texts().stream().map(Read.Text::words))
        .anyMatch(words -> words.contains("4800\u00a0kWh in = out"))
        .anyMatch(words -> words.startsWith("junctions and points") && words.contains("20.0"))
        .anyMatch(words -> words.contains("a licensed professional decide"));
  }

  private static double sum(List<Double> numbers) {
    double sum = 0;
    for (double number : numbers) {
      sum += number;
    }
    return sum;
  }

  /** No text leaves the sheet and no two labels of one side touch, however much there is to say. */
  @Test
  void many_parts_stay_readable() {
    List<Envelope.Part> parts = new ArrayList<>();
    for (int i = 0; i < 40; i++) {
      parts.add(
          part(Envelope.Kind.ELEMENT, "a plane element with a rather long name " + i, 1 + i % 7));
    }
    parts.add(part(Envelope.Kind.JUNCTION, "edge", 0.5));
    Read plot = Read.of(new LedgerPlot("House of many parts", designed(parts)).svg());
    List<Box> boxes = new ArrayList<>();
    Element labels = plot.layers("ledger-labels").get(0);
    NodeList texts = labels.getElementsByTagName("text");
    for (int i = 0; i < texts.getLength(); i++) {
      Element text = (Element) texts.item(i);
      double x = Double.parseDouble(text.getAttribute("x"));
      double y = Double.parseDouble(text.getAttribute("y"));
      double width = TextWidths.of(text.getTextContent(), Lettering.SMALL);
      double left = text.getAttribute("text-anchor").equals("end") ? x - width : x;
      boxes.add(new Box(left, y - 7, left + width, y + 1));
    }
    assertThat(boxes).hasSizeGreaterThan(15);
    for (int i = 0; i < boxes.size(); i++) {
      assertThat(boxes.get(i).x0()).isPositive();
      assertThat(boxes.get(i).x1()).isLessThan(960);
      for (int k = i + 1; k < boxes.size(); k++) {
        assertThat(boxes.get(i).meets(boxes.get(k))).as(i + " and " + k).isFalse();
      }
    }
    assertThat(labels.getTextContent()).contains(" others").contains("junctions and points");
  }

  /** More by the data than came in: the remainder comes in; junctions may lessen what leaves. */
  @Test
  void either_sign_is_drawn() {
    Envelope envelope =
        new Envelope(
            List.of(
                part(Envelope.Kind.ELEMENT, "wall", 60),
                new Envelope.Part(
                    Envelope.Kind.JUNCTION, "eaves", 10, Uncertain.exact(-0.5), "", ONE, "")));
    Ledger ledger =
        Ledger.metered(
            envelope, climate(), List.of(), 0, new Meters(1000, 0, 0, 0, 0, 0, List.of()));
    Read plot = Read.of(new LedgerPlot("House", ledger).svg());
    // 2880 out by the wall; 1000 by meter, 240 less by the eaves, 1640 not explained.
    assertThat(heights(plot, "in")).hasSize(3);
    assertThat(heights(plot, "out")).hasSize(1);
    assertThat(sum(heights(plot, "in"))).isCloseTo(sum(heights(plot, "out")), within(0.1));
    assertThat(plot.layers("ledger-labels").get(0).getTextContent())
        .contains("more leaves by the data than came in")
        .contains("1640");
  }

  @Test
  void nothing_is_said_to_be_nothing() {
    Ledger ledger =
        Ledger.metered(
            new Envelope(List.of()),
            climate(),
            List.of(),
            0,
            new Meters(0, 0, 0, 0, 0, 0, List.of()));
    assertThat(new LedgerPlot("Empty", ledger).svg()).contains("Nothing comes in");
  }
}
