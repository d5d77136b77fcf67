/**
 * A binary heap of integer keys, each with an item and a tag. Of equal keys the one that went in last comes out
 * first, so that a search takes the same way every time and goes on along the way it is on.
 */
export class Heap {
  private keys = new Float64Array(1024);
  private items = new Int32Array(1024);
  private tags = new Int32Array(1024);
  private entered = 0;
  size = 0;
  /** The tag of the item that `pop` gave last. */
  poppedTag = 0;

  clear(): void {
    this.size = 0;
    this.entered = 0;
  }

  push(key: number, item: number, tag: number): void {
    if (this.size === this.keys.length) this.grow();
    const { keys, items, tags } = this;
    // The order of entry is the fraction of the key; a search enters far fewer than 2^26 items.
    const rank = key - this.entered++ / 0x4000000;
    let at = this.size++;
    while (at > 0) {
      const above = (at - 1) >> 1;
      const keyAbove = keys[above] ?? 0;
      if (keyAbove <= rank) break;
      keys[at] = keyAbove;
      items[at] = items[above] ?? 0;
      tags[at] = tags[above] ?? 0;
      at = above;
    }
    keys[at] = rank;
    items[at] = item;
    tags[at] = tag;
  }

  /** Takes out the item of the least key. Only while `size` is above 0. */
  pop(): number {
    const { keys, items, tags } = this;
    const item = items[0] ?? 0;
    this.poppedTag = tags[0] ?? 0;
    const last = --this.size;
    const rank = keys[last] ?? 0;
    const movedItem = items[last] ?? 0;
    const movedTag = tags[last] ?? 0;
    let at = 0;
    for (;;) {
      let below = 2 * at + 1;
      if (below >= last) break;
      if (below + 1 < last && (keys[below + 1] ?? 0) < (keys[below] ?? 0)) below++;
      const keyBelow = keys[below] ?? 0;
      if (keyBelow >= rank) break;
      keys[at] = keyBelow;
      items[at] = items[below] ?? 0;
      tags[at] = tags[below] ?? 0;
      at = below;
    }
    keys[at] = rank;
    items[at] = movedItem;
    tags[at] = movedTag;
    return item;
  }

  private grow(): void {
    const length = this.keys.length * 2;
    const keys = new Float64Array(length);
    const items = new Int32Array(length);
    const tags = new Int32Array(length);
    keys.set(this.keys);
    items.set(this.items);
    tags.set(this.tags);
    this.keys = keys;
    this.items = items;
    this.tags = tags;
  }
}
