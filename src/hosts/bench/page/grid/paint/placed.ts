/** An element that stands over a column. */
export interface Placed {
  readonly element: HTMLElement;
  place(left: number, width: number): void;
  /** Its column is out of view. */
  hide(): void;
}

export function placed(element: HTMLElement): Placed {
  let [left, width, isHidden] = [-1, -1, false];
  return {
    element,
    place(nextLeft, nextWidth) {
      if (left !== nextLeft) element.style.left = `${nextLeft}px`;
      if (width !== nextWidth) element.style.width = `${nextWidth}px`;
      if (isHidden || nextWidth === 0) element.hidden = isHidden = nextWidth === 0;
      [left, width] = [nextLeft, nextWidth];
    },
    hide() {
      if (!isHidden) element.hidden = isHidden = true;
    },
  };
}
