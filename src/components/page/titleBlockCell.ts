export interface TitleBlockCell {
  label: string;
  value: string;
  /** Takes two of the four columns. */
  wide?: boolean;
}
