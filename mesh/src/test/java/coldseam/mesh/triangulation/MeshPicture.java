package coldseam.mesh.triangulation;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Path;
import javax.imageio.ImageIO;

/** Draws a mesh, or a window of it, as PNG: to be looked at while working on the triangulation. */
final class MeshPicture {
  private MeshPicture() {}

  static void write(Mesh mesh, Path file) throws IOException {
    double minX = Double.POSITIVE_INFINITY;
    double minY = Double.POSITIVE_INFINITY;
    double maxX = Double.NEGATIVE_INFINITY;
    double maxY = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < mesh.vertexCount(); v++) {
      minX = Math.min(minX, mesh.x(v));
      minY = Math.min(minY, mesh.y(v));
      maxX = Math.max(maxX, mesh.x(v));
      maxY = Math.max(maxY, mesh.y(v));
    }
    write(mesh, file, minX, minY, maxX, maxY);
  }

  static void write(Mesh mesh, Path file, double minX, double minY, double maxX, double maxY)
      throws IOException {
    double scale = 1400 / Math.max(maxX - minX, maxY - minY);
    int width = (int) (scale * (maxX - minX)) + 40;
    int height = (int) (scale * (maxY - minY)) + 40;
    BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
    Graphics2D g = image.createGraphics();
    g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
    g.setColor(Color.WHITE);
    g.fillRect(0, 0, width, height);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double[] px = new double[3];
      double[] py = new double[3];
      Path2D path = new Path2D.Double();
      for (int k = 0; k < 3; k++) {
        px[k] = 20 + scale * (mesh.x(mesh.vertex(t, k)) - minX);
        py[k] = height - 20 - scale * (mesh.y(mesh.vertex(t, k)) - minY);
        if (k == 0) {
          path.moveTo(px[k], py[k]);
        } else {
          path.lineTo(px[k], py[k]);
        }
      }
      path.closePath();
      g.setColor(Color.getHSBColor(mesh.label(t) * 0.381966f, 0.25f, 1));
      g.fill(path);
      g.setColor(Color.DARK_GRAY);
      for (int k = 0; k < 3; k++) {
        g.setStroke(new BasicStroke(mesh.partitionEdge(t, k) == Mesh.NONE ? 0.7f : 2f));
        g.draw(
            new Line2D.Double(px[(k + 1) % 3], py[(k + 1) % 3], px[(k + 2) % 3], py[(k + 2) % 3]));
      }
    }
    g.dispose();
    ImageIO.write(image, "png", file.toFile());
  }
}
