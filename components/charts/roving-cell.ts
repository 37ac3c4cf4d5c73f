interface Cell {
  readonly row: number;
  readonly column: number;
}

/** Where a key leads from a cell of a grid, staying inside it; null for keys that do not move. */
export function rovingCell(
  key: string,
  at: Cell,
  size: { readonly rows: number; readonly columns: number },
): Cell | null {
  const moved = (rows: number, columns: number): Cell => ({
    row: Math.min(size.rows - 1, Math.max(0, at.row + rows)),
    column: Math.min(size.columns - 1, Math.max(0, at.column + columns)),
  });
  switch (key) {
    case 'ArrowDown':
      return moved(1, 0);
    case 'ArrowUp':
      return moved(-1, 0);
    case 'ArrowRight':
      return moved(0, 1);
    case 'ArrowLeft':
      return moved(0, -1);
    case 'Home':
      return moved(0, -size.columns);
    case 'End':
      return moved(0, size.columns);
    case 'PageUp':
      return moved(-size.rows, 0);
    case 'PageDown':
      return moved(size.rows, 0);
    default:
      return null;
  }
}
