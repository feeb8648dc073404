package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * The mixed problem on the triangles around a vertex with hat function ψ: the flux q that is
 * nearest to −ψλ∇u,
 *
 * <p>∫(q + ψλ∇u)·λ⁻¹(q + ψλ∇u) + Σ_film ∫Rs (q_n − ψ(u − δ)/Rs)² → min,
 *
 * <p>among those with div q = −λ∇u·∇ψ that do not cross the rim of the patch nor sides without
 * flow, and bring in ψg where a flow g is given. Films and fixed temperatures leave q_n free. Where
 * the vertex touches neither, the divergences must sum to what is given; they do because ψ is one
 * of the functions u was tested with, and one condition is left out.
 */
final class FluxPatch {
  /** Points and weights of Gauss on [0, 1], exact to degree 5. */
  private static final double[][] GAUSS = {
    {0.5 - Math.sqrt(0.15), 5.0 / 18}, {0.5, 8.0 / 18}, {0.5 + Math.sqrt(0.15), 5.0 / 18}
  };

  /** A condition on the patch's unknowns: Σ factor · unknown, and its values field by field. */
  private record Condition(int[] unknown, double[] factor, double[] value) {}

  private final PatchEquilibration whole;
  private final FluxElement element;
  private final Mesh mesh;
  private final int[] triangles;
  private final int[] corner;

  /** For each triangle the unknown of each moment, −1 where it is 0. */
  private final int[][] unknown;

  /** For each triangle the sign of each moment as seen from it. */
  private final double[][] sign;

  private final int unknowns;
  private final int fieldCount;
  private boolean closed = true;

  FluxPatch(PatchEquilibration whole, int vertex, int[] triangles) {
    this.whole = whole;
    this.triangles = triangles;
    element = whole.element;
    mesh = whole.d.mesh;
    fieldCount = whole.fields.length;
    corner = new int[triangles.length];
    unknown = new int[triangles.length][element.size];
    sign = new double[triangles.length][element.size];
    Map<Integer, Integer> ofSide = new HashMap<>();
    int count = 0;
    for (int i = 0; i < triangles.length; i++) {
      int t = triangles[i];
      for (int k = 0; k < 3; k++) {
        corner[i] = mesh.vertex(t, k) == vertex ? k : corner[i];
      }
      for (int k = 0; k < 3; k++) {
        int first = -1;
        if (k != corner[i] && crossed(t, k)) {
          if (!ofSide.containsKey(mesh.side(t, k))) {
            ofSide.put(mesh.side(t, k), count);
            count += element.perSide;
          }
          first = ofSide.get(mesh.side(t, k));
        }
        numberSide(i, k, first);
      }
      for (int m = 3 * element.perSide; m < element.size; m++) {
        unknown[i][m] = count++;
        sign[i][m] = 1;
      }
    }
    unknowns = count;
  }

  /** Whether heat may cross a side; takes note of where how much is free. */
  private boolean crossed(int t, int k) {
    if (mesh.neighbour(t, k) != Mesh.NONE) {
      return true;
    }
    int s = whole.d.outline.of(t, k);
    if (s >= 0 && whole.d.outline.kind[s] != Conditions.Kind.FLOW) {
      closed = false;
    }
    return s >= 0;
  }

  /** From the other triangle the normal turns round, and odd polynomials change sign once more. */
  private void numberSide(int i, int k, int first) {
    int t = triangles[i];
    boolean along = mesh.vertex(t, (k + 1) % 3) == mesh.sideStart(mesh.side(t, k));
    for (int j = 0; j < element.perSide; j++) {
      unknown[i][k * element.perSide + j] = first < 0 ? -1 : first + j;
      sign[i][k * element.perSide + j] = along || j % 2 == 1 ? 1 : -1;
    }
  }

  /** Solves for every field and adds the fluxes to the whole. */
  void addTo(double[][] flux) {
    List<Condition> conditions = conditions();
    int n = unknowns + conditions.size();
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    DMatrixRMaj right = new DMatrixRMaj(n, fieldCount);
    energies(matrix);
    loads(right);
    for (int c = 0; c < conditions.size(); c++) {
      Condition condition = conditions.get(c);
      for (int m = 0; m < condition.unknown.length; m++) {
        if (condition.unknown[m] >= 0) {
          matrix.add(unknowns + c, condition.unknown[m], condition.factor[m]);
          matrix.add(condition.unknown[m], unknowns + c, condition.factor[m]);
        }
      }
      for (int f = 0; f < fieldCount; f++) {
        right.set(unknowns + c, f, condition.value[f]);
      }
    }
    DMatrixRMaj solution = solve(matrix, right);
    for (int f = 0; f < fieldCount; f++) {
      for (int i = 0; i < triangles.length; i++) {
        double[] moments = new double[element.size];
        for (int m = 0; m < element.size; m++) {
          moments[m] = unknown[i][m] < 0 ? 0 : sign[i][m] * solution.get(unknown[i][m], f);
        }
        double[] part = element.flux(moments);
        for (int v = 0; v < 12; v++) {
          flux[f][12 * triangles[i] + v] += part[v];
        }
      }
    }
  }

  private void energies(DMatrixRMaj matrix) {
    for (int i = 0; i < triangles.length; i++) {
      double[] metric = whole.resistance[triangles[i]];
      for (int a = 0; a < element.size; a++) {
        for (int b = 0; b < element.size; b++) {
          double value = 0;
          for (int part = 0; part < 3; part++) {
            value += metric[part] * element.energy[part][a][b];
          }
          add(matrix, i, a, b, value);
        }
      }
      for (int k = 0; k < 3; k++) {
        int s = film(i, k);
        for (int j = 0; s >= 0 && j < element.perSide; j++) {
          int m = k * element.perSide + j;
          double perLength = whole.d.outline.filmM2KPerW[s] / whole.d.outline.lengthM[s];
          add(matrix, i, m, m, (2 * j + 1) * perLength);
        }
      }
    }
  }

  private void add(DMatrixRMaj matrix, int i, int a, int b, double value) {
    if (unknown[i][a] >= 0 && unknown[i][b] >= 0) {
      matrix.add(unknown[i][a], unknown[i][b], sign[i][a] * sign[i][b] * value);
    }
  }

  /** Index in the outline of a side of the patch with a film, −1 if it is none. */
  private int film(int i, int k) {
    int s = whole.d.outline.of(triangles[i], k);
    boolean film = s >= 0 && whole.d.outline.kind[s] == Conditions.Kind.FILM;
    return film && k != corner[i] ? s : -1;
  }

  /** −∫ψ∇u·q′ + Σ_film ∫ψ(u − δ) q_n′. */
  private void loads(DMatrixRMaj right) {
    for (int f = 0; f < fieldCount; f++) {
      for (int i = 0; i < triangles.length; i++) {
        double[] slope = FluxElement.hat(whole.gradient(f, triangles[i]), corner[i]);
        double[] aim = FluxElement.weighted(slope);
        for (int m = 0; m < element.size; m++) {
          double sum = 0;
          for (int v = 0; v < 12; v++) {
            sum -= aim[v] * element.basis[m][v];
          }
          load(right, i, m, f, sum);
        }
        for (int k = 0; k < 3; k++) {
          int s = film(i, k);
          for (int j = 0; s >= 0 && j < element.perSide; j++) {
            double moment = filmMoment(whole.aboveSpace(f, s), k == (corner[i] + 2) % 3, j);
            load(right, i, k * element.perSide + j, f, (2 * j + 1) * moment);
          }
        }
      }
    }
  }

  private void load(DMatrixRMaj right, int i, int m, int f, double value) {
    if (unknown[i][m] >= 0) {
      right.add(unknown[i][m], f, sign[i][m] * value);
    }
  }

  /** ∫ψ v P_j along a side of length 1, ψ falling from its start or rising to its end. */
  private static double filmMoment(double[] v, boolean falling, int j) {
    double sum = 0;
    for (double[] point : GAUSS) {
      double s = point[0];
      double value = v[0] * (1 - s) * (1 - 2 * s) + 4 * v[1] * s * (1 - s) + v[2] * s * (2 * s - 1);
      sum += point[1] * (falling ? 1 - s : s) * value * FluxElement.legendre(j, s);
    }
    return sum;
  }

  private List<Condition> conditions() {
    List<Condition> conditions = new ArrayList<>();
    for (int i = 0; i < triangles.length; i++) {
      double[][] wanted = new double[fieldCount][];
      for (int f = 0; f < fieldCount; f++) {
        wanted[f] = divergence(f, i);
      }
      for (int part = closed && i == 0 ? 1 : 0; part < 3; part++) {
        double[] factor = new double[element.size];
        for (int m = 0; m < element.size; m++) {
          factor[m] = sign[i][m] * part(element.divergence[m], part);
        }
        double[] value = new double[fieldCount];
        for (int f = 0; f < fieldCount; f++) {
          value[f] = part(wanted[f], part);
        }
        conditions.add(new Condition(unknown[i], factor, value));
      }
      for (int k = 0; k < 3; k++) {
        int s = whole.d.outline.of(triangles[i], k);
        if (k != corner[i] && s >= 0 && whole.d.outline.kind[s] == Conditions.Kind.FLOW) {
          givenFlow(i, k, s, conditions);
        }
      }
    }
    return conditions;
  }

  /** Mean of three corner values, or what one differs from it. */
  private static double part(double[] corners, int part) {
    double mean = (corners[0] + corners[1] + corners[2]) / 3;
    return part == 0 ? mean : corners[part] - mean;
  }

  /** −λ∇u·∇ψ at the corners, on the reference triangle. */
  private double[] divergence(int f, int i) {
    double[] along = whole.conducted(f, triangles[i]);
    double[] out = new double[3];
    for (int c = 0; c < 3; c++) {
      for (int axis = 0; axis < 2; axis++) {
        out[c] -= along[2 * c + axis] * FluxElement.hatSlope(corner[i], axis);
      }
    }
    return out;
  }

  /** Outward −ψg: its moments against P_0 and P_1; there is no other. */
  private void givenFlow(int i, int k, int s, List<Condition> conditions) {
    boolean falling = k == (corner[i] + 2) % 3;
    for (int j = 0; j < element.perSide; j++) {
      int m = k * element.perSide + j;
      double moment = j == 0 ? 0.5 : j > 1 ? 0 : falling ? -1.0 / 6 : 1.0 / 6;
      double[] value = new double[fieldCount];
      value[whole.d.spaces] =
          -moment * whole.d.outline.lengthM[s] * whole.d.outline.flowWPerM2[s] * sign[i][m];
      conditions.add(new Condition(new int[] {unknown[i][m]}, new double[] {1}, value));
    }
  }

  /** Scaled to like sizes, solved, and refined once. */
  private DMatrixRMaj solve(DMatrixRMaj matrix, DMatrixRMaj right) {
    int n = matrix.numRows;
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      double largest = 0;
      for (int j = 0; i >= unknowns && j < unknowns; j++) {
        largest = Math.max(largest, Math.abs(matrix.get(i, j)) * scale[j]);
      }
      scale[i] = i < unknowns ? 1 / Math.sqrt(matrix.get(i, i)) : 1 / largest;
    }
    CommonOps_DDRM.multRows(scale, matrix);
    CommonOps_DDRM.multCols(matrix, scale);
    CommonOps_DDRM.multRows(scale, right);
    LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.lu(n);
    if (!solver.setA(matrix.copy())) {
      throw new IllegalStateException("a patch has no flux with its divergence");
    }
    DMatrixRMaj x = new DMatrixRMaj(n, right.numCols);
    solver.solve(right, x);
    DMatrixRMaj residual = right.copy();
    CommonOps_DDRM.multAdd(-1, matrix, x, residual);
    DMatrixRMaj correction = new DMatrixRMaj(n, right.numCols);
    solver.solve(residual, correction);
    CommonOps_DDRM.addEquals(x, correction);
    CommonOps_DDRM.multRows(scale, x);
    return x;
  }
}
