/**
 * A queue that serves its groups in turn: a class that queues thirty runs does not make another
 * class wait for all of them. Within a group first come, first served.
 */
export class FairQueue<T> {
  readonly #groups = new Map<string, T[]>();
  #size = 0;

  get size(): number {
    return this.#size;
  }

  /** Items of one group. */
  sizeOf(group: string): number {
    return this.#groups.get(group)?.length ?? 0;
  }

  add(group: string, item: T): void {
    const items = this.#groups.get(group);
    if (items === undefined) this.#groups.set(group, [item]);
    else items.push(item);
    this.#size++;
  }

  /** Puts an item back at the head of its group, which is next. */
  addFirst(group: string, item: T): void {
    const items = this.#groups.get(group) ?? [];
    items.unshift(item);
    const others = [...this.#groups].filter(([name]) => name !== group);
    this.#groups.clear();
    this.#groups.set(group, items);
    for (const [name, list] of others) this.#groups.set(name, list);
    this.#size++;
  }

  /** The next item; its group goes to the end of the line. */
  take(): T | undefined {
    for (const [group, items] of this.#groups) {
      const item = items.shift();
      this.#groups.delete(group);
      if (items.length > 0) this.#groups.set(group, items);
      this.#size--;
      return item;
    }
    return undefined;
  }
}
