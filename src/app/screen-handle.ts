/** What a route tells the layout around it. */
export interface ScreenHandle {
  /** The screen belongs to a household: its tasks are shown, and their room is kept while it loads. */
  household?: boolean;
  /** The screen has its own bar at the bottom of a phone. */
  ownBottomBar?: boolean;
}
