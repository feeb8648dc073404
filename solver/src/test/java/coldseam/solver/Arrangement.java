package coldseam.solver;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.function.UnaryOperator;

/**
 * Shapes thrown together as nobody would draw them: overlapping, nested, laid twice, touching in a
 * corner, a hair apart, clockwise, without area, crossing themselves, a million times smaller than
 * their neighbours, turned and far from the origin.
 *
 * @param shapes in the order laid
 * @param spaces every space, laid or not
 * @param move where the whole drawing lies, m to m
 */
record Arrangement(List<Shape> shapes, List<Space> spaces, UnaryOperator<Point> move) {
  /** Distances that decide whether two points are one, mm; 1e-5 and 1e-3 are the resolution. */
  private static final double[] HAIRS = {
    1e-9, 1e-7, 1e-6, 0.9e-5, 1.1e-5, 1e-4, 0.9e-3, 1.1e-3, 3e-3, 0.01, 0.05, 0.1, 0.3, 1
  };

  /** How the drawing lies, mm; 0 is as good as any. */
  private static final double[] FAR = {0, 0, 1e3, 1e5, 1e7};

  /**
   * One shape.
   *
   * @param fill what fills it
   * @param xy corners, mm
   */
  record Shape(Fill fill, double[] xy) {}

  /** The arrangement of a number. */
  static Arrangement of(long number) {
    // numbers that follow each other make generators that begin alike
    Random random = new Random(number * 0x9E3779B97F4A7C15L);
    List<Space> spaces = spaces(random);
    List<Fill> fills = new ArrayList<>(List.of(new Hollow("hollow")));
    for (int i = 0; i < 2 + random.nextInt(4); i++) {
      fills.add(Material.of("material " + i, Math.pow(10, -3 + 6 * random.nextDouble())));
    }
    List<Shape> shapes = new ArrayList<>();
    ground(random, spaces, (Material) fills.get(1), shapes);
    for (Space more : spaces.subList(2, spaces.size())) {
      shapes.add(new Shape(more, outline(random, shapes)));
    }
    int count = 1 + random.nextInt(random.nextInt(8) == 0 ? 40 : 8);
    for (int i = 0; i < count; i++) {
      boolean open = random.nextInt(6) == 0;
      Fill fill =
          open
              ? spaces.get(random.nextInt(spaces.size()))
              : fills.get(Math.min(fills.size() - 1, random.nextInt(4 * fills.size())));
      shapes.add(new Shape(fill, outline(random, shapes)));
    }
    return new Arrangement(shapes, spaces, placed(random));
  }

  /** A block between two spaces, so that most arrangements can be solved. */
  private static void ground(Random random, List<Space> spaces, Material block, List<Shape> into) {
    double over = random.nextBoolean() ? 0 : 200;
    into.add(new Shape(spaces.get(0), box(-over, -500, 1000 + over, 0)));
    into.add(new Shape(spaces.get(1), box(-over, 400, 1000 + over, 900)));
    into.add(new Shape(block, box(0, 0, 1000, 400)));
  }

  private static List<Space> spaces(Random random) {
    List<Space> spaces = new ArrayList<>();
    int count = 2 + (random.nextInt(4) == 0 ? 1 + random.nextInt(2) : 0);
    for (int i = 0; i < count; i++) {
      double film = random.nextInt(5) == 0 ? 0 : Math.pow(10, -3 + 4 * random.nextDouble());
      Exposure exposure = i == 0 ? Exposure.INSIDE : Exposure.OUTSIDE;
      Space space = DrawnDetail.space("space " + i, 20 - 13 * i, exposure, film);
      spaces.add(i > 1 && random.nextBoolean() ? DrawnDetail.floating(space, 0, "") : space);
    }
    return spaces;
  }

  private static UnaryOperator<Point> placed(Random random) {
    double turn = random.nextBoolean() ? 0 : Math.toRadians(random.nextInt(360));
    double cos = Math.cos(turn);
    double sin = Math.sin(turn);
    double mirror = random.nextInt(4) == 0 ? -1 : 1;
    double dx = FAR[random.nextInt(FAR.length)] / 1000;
    double dy = -FAR[random.nextInt(FAR.length)] / 1000;
    return p ->
        new Point(dx + mirror * (p.x() * cos - p.y() * sin), dy + p.x() * sin + p.y() * cos);
  }

  private static double[] outline(Random random, List<Shape> before) {
    double[] xy =
        switch (random.nextInt(9)) {
          case 0, 1 -> box(grid(random), grid(random), grid(random), grid(random));
          case 2 -> sheet(random);
          case 3 -> corners(random, 3 + random.nextInt(5), 50);
          case 4 -> disc(random);
          case 5 -> tiny(random);
          default -> near(random, before.get(random.nextInt(before.size())).xy());
        };
    return switch (random.nextInt(12)) {
      case 0 -> reversed(xy);
      case 1 -> repeated(random, xy);
      case 2 -> flat(random, xy);
      default -> xy;
    };
  }

  private static double grid(Random random) {
    return -100 + 50.0 * random.nextInt(25);
  }

  private static double[] box(double x0, double y0, double x1, double y1) {
    return new double[] {x0, y0, x1, y0, x1, y1, x0, y1};
  }

  /** From foil to board, along a line of the grid or askew. */
  private static double[] sheet(Random random) {
    double thickness = HAIRS[4 + random.nextInt(HAIRS.length - 4)];
    double x = grid(random);
    double y = grid(random) / 2;
    double length = 50 + 50.0 * random.nextInt(20);
    double lean = random.nextInt(3) == 0 ? 100 * random.nextGaussian() : 0;
    return new double[] {
      x, y, x + length, y + lean, x + length, y + lean + thickness, x, y + thickness
    };
  }

  /** Any corners; they may cross themselves, repeat or lie on one line. */
  private static double[] corners(Random random, int count, double step) {
    double[] xy = new double[2 * count];
    for (int i = 0; i < xy.length; i++) {
      xy[i] = random.nextBoolean() ? step * random.nextInt(20) : 1000 * random.nextDouble();
    }
    return xy;
  }

  private static double[] disc(Random random) {
    int chords = 3 + random.nextInt(60);
    double x = grid(random);
    double y = grid(random) / 2;
    double radius = 200 * random.nextDouble();
    double[] xy = new double[2 * chords];
    for (int i = 0; i < chords; i++) {
      xy[2 * i] = x + radius * Math.cos(2 * Math.PI * i / chords);
      xy[2 * i + 1] = y + radius * Math.sin(2 * Math.PI * i / chords);
    }
    return xy;
  }

  /** Down to a millionth of the block. */
  private static double[] tiny(Random random) {
    double size = Math.pow(10, -4 + 5 * random.nextDouble());
    double x = grid(random);
    double y = grid(random) / 2;
    return box(x, y, x + size, y + size * (1 + random.nextInt(3)));
  }

  /** An earlier shape once more: as it is, a hair aside, or with single corners moved. */
  private static double[] near(Random random, double[] earlier) {
    double[] xy = earlier.clone();
    double hair = HAIRS[random.nextInt(HAIRS.length)] * (random.nextBoolean() ? 1 : -1);
    switch (random.nextInt(5)) {
      case 0 -> {}
      case 1 -> {
        for (int i = random.nextInt(2); i < xy.length; i += 2) {
          xy[i] += hair;
        }
      }
      case 2 -> {
        int at = random.nextInt(xy.length);
        xy[at] += hair;
      }
      case 3 -> {
        double width = extent(xy, 0);
        for (int i = 0; i < xy.length; i += 2) {
          xy[i] += width + hair;
        }
      }
      default -> {
        double scale = random.nextBoolean() ? 0.5 : 1 + hair / 1000;
        for (int i = 0; i < xy.length; i++) {
          xy[i] = xy[i % 2] + scale * (xy[i] - xy[i % 2]);
        }
      }
    }
    return xy;
  }

  private static double extent(double[] xy, int from) {
    double least = xy[from];
    double most = xy[from];
    for (int i = from; i < xy.length; i += 2) {
      least = Math.min(least, xy[i]);
      most = Math.max(most, xy[i]);
    }
    return most - least;
  }

  private static double[] reversed(double[] xy) {
    double[] back = new double[xy.length];
    for (int i = 0; i < xy.length; i += 2) {
      back[i] = xy[xy.length - 2 - i];
      back[i + 1] = xy[xy.length - 1 - i];
    }
    return back;
  }

  /** One corner twice, or there and back. */
  private static double[] repeated(Random random, double[] xy) {
    int at = 2 * random.nextInt(xy.length / 2);
    boolean spike = random.nextBoolean();
    double[] more = Arrays.copyOf(xy, xy.length + (spike ? 4 : 2));
    System.arraycopy(xy, at, more, more.length - (xy.length - at), xy.length - at);
    more[at] = xy[at];
    more[at + 1] = xy[at + 1];
    if (spike) {
      more[at + 2] = xy[at] + 70 * random.nextGaussian();
      more[at + 3] = xy[at + 1] + HAIRS[random.nextInt(HAIRS.length)];
    }
    return more;
  }

  /** Pressed to a line, or nearly. */
  private static double[] flat(Random random, double[] xy) {
    double[] pressed = xy.clone();
    double left = random.nextBoolean() ? 0 : HAIRS[random.nextInt(HAIRS.length)] / 1000;
    for (int i = 3; i < pressed.length; i += 2) {
      pressed[i] = pressed[1] + left * (pressed[i] - pressed[1]);
    }
    return pressed;
  }

  DrawnDetail drawn() {
    DrawnDetail drawn = new DrawnDetail().moved(move);
    spaces.forEach(drawn::know);
    for (Shape shape : shapes) {
      drawn.polygon(shape.fill(), shape.xy());
    }
    return drawn;
  }

  /** As Java, for a regression test. */
  String text() {
    StringBuilder text = new StringBuilder();
    for (Space space : spaces) {
      text.append(space).append('\n');
    }
    for (Shape shape : shapes) {
      text.append(shape.fill().name()).append(' ').append(Arrays.toString(shape.xy())).append('\n');
    }
    Point origin = move.apply(new Point(0, 0));
    Point right = move.apply(new Point(1, 0));
    return text.append("(0, 0) -> ").append(origin).append(", (1, 0) -> ").append(right).toString();
  }
}
