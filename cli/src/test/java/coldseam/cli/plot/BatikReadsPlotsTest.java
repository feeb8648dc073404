package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cli.plot.Plots.Kind;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.geom.PathIterator;
import java.awt.geom.Point2D;
import java.awt.geom.Rectangle2D;
import java.io.StringReader;
import java.util.stream.Stream;
import org.apache.batik.parser.AWTPathProducer;
import org.apache.batik.parser.AWTTransformProducer;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.w3c.dom.Element;

/** The paths and turns of the plots as a library for SVG reads them (Batik, SVG 1.1). */
class BatikReadsPlotsTest {
  static Stream<Solved> cases() {
    return Solved.shipped().stream();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void every_path_and_text_lies_on_the_sheet(Solved solved) throws Exception {
    for (Kind kind : Kind.values()) {
      Read plot = Read.of(solved.svg(kind));
      double width = Double.parseDouble(plot.root().getAttribute("width"));
      double height = Double.parseDouble(plot.root().getAttribute("height"));
      Rectangle2D sheet = new Rectangle2D.Double(-1, -1, width + 2, height + 2);
      int drawn = 0;
      for (Element path : plot.all("path")) {
        Shape shape =
            AWTPathProducer.createShape(
                new StringReader(path.getAttribute("d")), PathIterator.WIND_NON_ZERO);
        Rectangle2D box = shape.getBounds2D();
        assertThat(
                sheet.contains(box.getMinX(), box.getMinY())
                    && sheet.contains(box.getMaxX(), box.getMaxY()))
            .as(kind + path.getAttribute("d"))
            .isTrue();
        drawn++;
      }
      assertThat(drawn).isGreaterThan(2);
      for (Element text : plot.all("text")) {
        double x = Double.parseDouble(text.getAttribute("x"));
        double y = Double.parseDouble(text.getAttribute("y"));
        Point2D anchor = new Point2D.Double(x, y);
        if (text.hasAttribute("transform")) {
          AffineTransform turn =
              AWTTransformProducer.createAffineTransform(text.getAttribute("transform"));
          anchor = turn.transform(anchor, null);
          assertThat(anchor.distance(x, y)).as("turned about its anchor").isLessThan(0.01);
        }
        assertThat(sheet.contains(anchor)).as(text.getTextContent()).isTrue();
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void a_line_read_by_the_library_ends_where_it_was_drawn(Solved solved) throws Exception {
    for (Element path : Read.of(solved.svg(Kind.TEMPERATURE)).all("path")) {
      String data = path.getAttribute("d");
      Shape shape = AWTPathProducer.createShape(new StringReader(data), PathIterator.WIND_NON_ZERO);
      if (data.matches("[Mlhv0-9. -]*")) {
        Polyline last = Read.path(data).get(Read.path(data).size() - 1);
        double[] c = new double[6];
        for (PathIterator i = shape.getPathIterator(null); !i.isDone(); i.next()) {
          i.currentSegment(c);
        }
        assertThat(c[0]).isCloseTo(last.x(last.size() - 1), within(0.01));
        assertThat(c[1]).isCloseTo(last.y(last.size() - 1), within(0.01));
      }
    }
  }
}
