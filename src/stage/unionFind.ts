/**
 * Disjoint sets of keys, joined by size with path halving (Tarjan and van Leeuwen 1984). A key not met before is a
 * set of its own.
 */
export class UnionFind {
  private readonly parent = new Map<string, string>();
  private readonly size = new Map<string, number>();

  add(key: string): void {
    if (this.parent.has(key)) return;
    this.parent.set(key, key);
    this.size.set(key, 1);
  }

  find(key: string): string {
    this.add(key);
    let at = key;
    for (;;) {
      const parent = this.parent.get(at) ?? at;
      if (parent === at) return at;
      const grand = this.parent.get(parent) ?? parent;
      this.parent.set(at, grand);
      at = grand;
    }
  }

  join(one: string, other: string): void {
    const a = this.find(one);
    const b = this.find(other);
    if (a === b) return;
    const [small, large] = (this.size.get(a) ?? 1) < (this.size.get(b) ?? 1) ? [a, b] : [b, a];
    this.parent.set(small, large);
    this.size.set(large, (this.size.get(small) ?? 1) + (this.size.get(large) ?? 1));
  }
}
