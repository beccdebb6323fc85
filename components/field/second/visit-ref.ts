/** The visit that is read a second time. */
export interface VisitRef {
  nest: string;
  visit: string;
  /** Code and name of the nest. */
  title: string;
}
