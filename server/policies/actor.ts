/** The person on whose behalf a request acts. */
export interface Actor {
  id: string;
  name: string;
  email: string;
}
