package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.apache.commons.math3.linear.OpenMapRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;

class ElementSumTest {
  private static final int PLACES = 3;

  /** The same elements summed into a matrix of commons-math, places without unknown left out. */
  @Test
  void sumsWhatAGeneralMatrixSums() {
    Random random = new Random(20260405);
    for (int trial = 0; trial < 60; trial++) {
      int n = 1 + random.nextInt(30);
      int elements = random.nextInt(60);
      int[] member = new int[PLACES * elements];
      Arrays.setAll(member, i -> random.nextInt(n + 3) - 3);
      RealMatrix expected = new OpenMapRealMatrix(n, n);
      EntryList others = new EntryList();
      for (int u = 0; u < n; u++) {
        others.add(u, u, 0.5);
        expected.addToEntry(u, u, 0.5);
      }
      for (int i = 0; i < 3; i++) {
        int r = random.nextInt(n);
        int c = random.nextInt(n);
        others.add(r, c, 7);
        expected.addToEntry(r, c, 7);
        expected.addToEntry(c, r, r == c ? 0 : 7);
      }
      for (int i = 0; i < PLACES * PLACES * elements; i++) {
        int element = i / (PLACES * PLACES);
        int p = i / PLACES % PLACES;
        int q = i % PLACES;
        int r = member[PLACES * element + p];
        int c = member[PLACES * element + q];
        if (r >= 0 && c >= 0) {
          expected.addToEntry(r, c, entry(element, p, q));
        }
      }

      SparseSymmetric sum = ElementSum.of(n, PLACES, member, ElementSumTest::entry, others);

      RealMatrix found = new OpenMapRealMatrix(n, n);
      for (int c = 0; c < n; c++) {
        for (int p = sum.start(c); p < sum.start(c + 1); p++) {
          found.setEntry(sum.row(p), c, sum.value(p));
          found.setEntry(c, sum.row(p), sum.value(p));
        }
      }
      assertThat(found.subtract(expected).getNorm()).as("trial %d", trial).isLessThan(1e-12);
    }
  }

  private static double entry(int element, int p, int q) {
    return Math.sin(1 + element + 3 * p * q) + p + q;
  }

  /** A chain of springs, long enough to be made side by side: 2 on the diagonal, −1 beside it. */
  @Test
  void makesTheColumnsOfALargeMatrixSideBySide() {
    int n = 100_000;
    int[] member = new int[2 * (n + 1)];
    for (int e = 0; e <= n; e++) {
      member[2 * e] = e - 1;
      member[2 * e + 1] = e < n ? e : -1;
    }

    SparseSymmetric chain =
        ElementSum.of(n, 2, member, (e, p, q) -> p == q ? 1 : -1, new EntryList());

    assertThat(chain.entries()).isEqualTo(2 * n - 1);
    for (int c = 1; c < n; c++) {
      assertThat(chain.start(c + 1) - chain.start(c)).isEqualTo(2);
      assertThat(chain.row(chain.start(c))).isEqualTo(c - 1);
      assertThat(chain.value(chain.start(c))).isEqualTo(-1);
      assertThat(chain.value(chain.start(c) + 1)).isEqualTo(2);
    }
  }

  /** A place held by two corners of one element counts their products both ways. */
  @Test
  void countsBothOrdersOfTwoPlacesWithOneUnknown() {
    SparseSymmetric sum =
        ElementSum.of(1, 2, new int[] {0, 0}, (e, p, q) -> p == q ? 5 : -2, new EntryList());

    assertThat(sum.entries()).isEqualTo(1);
    assertThat(sum.value(0)).isCloseTo(5 + 5 - 2 - 2, within(0.0));
  }

  @Test
  void leavesEntriesThatAreZeroOut() {
    SparseSymmetric sum =
        ElementSum.of(2, 2, new int[] {0, 1}, (e, p, q) -> p == q ? 1 : 0, new EntryList());

    assertThat(sum.entries()).isEqualTo(2);
  }

  @Test
  void refusesAnUnknownWithoutAnEntry() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> ElementSum.of(2, 1, new int[] {0}, (element, p, q) -> 1, new EntryList()))
        .withMessageContaining("unknown 1 has no entry of its own");
  }
}
