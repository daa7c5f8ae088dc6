/** A map that forgets what was used longest ago once it weighs more than its limit. The newest entry always stays. */
export class RecentMap<Value> {
  private readonly entries = new Map<string, { readonly value: Value; readonly weight: number }>();
  private total = 0;

  constructor(private readonly maxWeight: number) {}

  get(key: string): Value | undefined {
    const entry = this.entries.get(key);
    if (entry === undefined) return undefined;
    this.entries.delete(key);
    this.entries.set(key, entry);
    return entry.value;
  }

  set(key: string, value: Value, weight = 1): void {
    this.drop(key);
    this.entries.set(key, { value, weight });
    this.total += weight;
    for (const oldest of this.entries.keys()) {
      if (this.total <= this.maxWeight || oldest === key) return;
      this.drop(oldest);
    }
  }

  private drop(key: string): void {
    this.total -= this.entries.get(key)?.weight ?? 0;
    this.entries.delete(key);
  }
}
