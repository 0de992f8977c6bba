/** Rows drawn above and below those in view, so that scrolling shows no gap. */
const AROUND = 8;

/** The rows to draw: index of the first, and of the one behind the last. */
export function rowWindow(view: { scrolled: number; height: number; rowHeight: number; rows: number }): {
  from: number;
  to: number;
} {
  const first = Math.floor(view.scrolled / view.rowHeight);
  const inView = Math.ceil(view.height / view.rowHeight);
  const from = Math.min(Math.max(first - AROUND, 0), Math.max(view.rows - 1, 0));
  return { from, to: Math.min(first + inView + AROUND, view.rows) };
}
