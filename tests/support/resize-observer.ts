/** jsdom has no layout, and so no ResizeObserver: one that never reports a size. */
class SilentResizeObserver implements ResizeObserver {
  observe(): void {
    // Nothing is ever laid out here.
  }

  unobserve(): void {
    // Nothing was observed.
  }

  disconnect(): void {
    // Nothing was observed.
  }
}

globalThis.ResizeObserver ??= SilentResizeObserver;
