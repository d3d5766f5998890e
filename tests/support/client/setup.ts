// What widgets ask of a browser and jsdom does not have.
class NoResizeObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
}

globalThis.ResizeObserver ??= NoResizeObserver as unknown as typeof ResizeObserver;
