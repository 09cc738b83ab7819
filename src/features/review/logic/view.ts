/** How a page is looked at: which one, how large, which way up. */

export interface View {
  pageIndex: number;
  /** 1 is the fitted size. */
  zoom: number;
  /** Quarter turns clockwise, 0 to 3. */
  turn: number;
  fit: 'page' | 'width';
}

export type ViewAction =
  | { do: 'show-page'; pageIndex: number }
  | { do: 'next-page' | 'previous-page' | 'zoom-in' | 'zoom-out' | 'turn' | 'fit' };

export const firstView: View = { pageIndex: 0, zoom: 1, turn: 0, fit: 'page' };

const zoomStep = 1.3;
const largestZoom = 6;
const smallestZoom = 0.5;

/** The view after an action; never past the first or last page or the limits of the zoom. */
export function reduceView(view: View, action: ViewAction, pageCount: number): View {
  const goTo = (pageIndex: number): View => {
    const bounded = Math.max(0, Math.min(pageCount - 1, pageIndex));
    return bounded === view.pageIndex ? view : { ...view, pageIndex: bounded, zoom: 1, turn: 0 };
  };
  switch (action.do) {
    case 'show-page':
      return goTo(action.pageIndex);
    case 'next-page':
      return goTo(view.pageIndex + 1);
    case 'previous-page':
      return goTo(view.pageIndex - 1);
    case 'zoom-in':
      return { ...view, zoom: Math.min(largestZoom, view.zoom * zoomStep) };
    case 'zoom-out':
      return { ...view, zoom: Math.max(smallestZoom, view.zoom / zoomStep) };
    case 'turn':
      return { ...view, turn: (view.turn + 1) % 4, zoom: 1 };
    case 'fit':
      return { ...view, fit: view.fit === 'page' ? 'width' : 'page', zoom: 1 };
  }
}

export interface Size {
  width: number;
  height: number;
}

export interface PlacedPage {
  /** The upright page, in CSS pixels. */
  page: Size;
  /** The room it takes once turned. */
  room: Size;
}

/** The size at which a page is drawn in the space there is. */
export function placePage(page: Size, space: Size, view: View): PlacedPage {
  const sideways = view.turn % 2 === 1;
  const turned = sideways ? { width: page.height, height: page.width } : page;
  const byWidth = space.width / turned.width;
  const byHeight = space.height / turned.height;
  const scale = (view.fit === 'width' ? byWidth : Math.min(byWidth, byHeight)) * view.zoom;
  const drawn = { width: page.width * scale, height: page.height * scale };
  return {
    page: drawn,
    room: sideways ? { width: drawn.height, height: drawn.width } : drawn,
  };
}
