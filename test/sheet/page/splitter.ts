/** Lets the panel be made wider or narrower, by dragging or with the arrow keys. */
export function attachSplitter(splitter: HTMLElement, start: number): void {
  const desk = splitter.parentElement;
  let width = start;
  const set = (next: number) => {
    width = Math.max(320, Math.min(window.innerWidth - 200, next));
    desk?.style.setProperty('--panel-width', `${width}px`);
    splitter.setAttribute('aria-valuenow', String(Math.round(width)));
  };
  set(start);
  splitter.addEventListener('pointerdown', (event) => {
    splitter.setPointerCapture(event.pointerId);
    document.body.classList.add('dragging');
  });
  splitter.addEventListener('pointermove', (event) => {
    if (splitter.hasPointerCapture(event.pointerId)) set(window.innerWidth - event.clientX - 3);
  });
  splitter.addEventListener('pointerup', (event) => {
    splitter.releasePointerCapture(event.pointerId);
    document.body.classList.remove('dragging');
  });
  splitter.addEventListener('keydown', (event) => {
    if (event.key === 'ArrowLeft') set(width + 20);
    if (event.key === 'ArrowRight') set(width - 20);
  });
}
