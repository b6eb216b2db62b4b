/** What the layout needs to know of a route. */
export interface RouteHandle {
  /** One thing is done here: on a phone the page's own head with its arrow stands alone, without ribbon and bars. */
  readonly isTask?: boolean;
  /** Anyone may read it, signed in or not. */
  readonly isOpen?: boolean;
}
