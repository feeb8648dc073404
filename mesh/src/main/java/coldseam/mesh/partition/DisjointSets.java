package coldseam.mesh.partition;

/** Sets of the numbers from 0 that can be united; a set is named by its lowest number. */
final class DisjointSets {
  private final int[] parent;

  DisjointSets(int count) {
    parent = new int[count];
    for (int i = 0; i < count; i++) {
      parent[i] = i;
    }
  }

  int find(int i) {
    int root = i;
    while (parent[root] != root) {
      root = parent[root];
    }
    int at = i;
    while (parent[at] != root) {
      int up = parent[at];
      parent[at] = root;
      at = up;
    }
    return root;
  }

  void unite(int i, int j) {
    int a = find(i);
    int b = find(j);
    parent[Math.max(a, b)] = Math.min(a, b);
  }
}
