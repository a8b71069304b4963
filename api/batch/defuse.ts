/** Plain numbers and quantities may begin with a sign; a spreadsheet makes no formula of them. */
const SIGNED_QUANTITY =
  /^[+-]?(?:\d+[.,]?\d*|\.\d+)(?:[eE][+-]?\d+)?(?: ?[A-Za-zµμΩ°%][A-Za-zµμΩ°%^/0-9 ]{0,20})?$/;

/**
 * A cell that no spreadsheet takes for a formula: one that begins with a sign of a formula gets an apostrophe in front,
 * which shows the rest as text.
 */
export function defused(cell: string): string {
  return /^[\s\u0000-\u001f]*[=+\-@＝＋－＠]/.test(cell) && !SIGNED_QUANTITY.test(cell) ? `'${cell}` : cell;
}
