/** Which ink a line is drawn in: ink for the present result, patina for target or parent, copper for what is chosen or yours. */
export type LineInk = 'ink' | 'patina' | 'copper';

export interface PlottedLine {
  readonly label: string;
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
  readonly ink: LineInk;
  readonly dashed?: boolean;
  /** Small squares at the samples. */
  readonly squares?: boolean;
}

export interface FigureAxis {
  /** With its unit. */
  readonly title: string;
  readonly from: number;
  readonly to: number;
  /** Distance of the ticks; chosen by itself when absent. */
  readonly step?: number;
}

/** A horizontal line with its name at the right edge. */
export interface FigureLevel {
  readonly at: number;
  readonly label: string;
}

/** How often each abscissa occurs, as bars from the lower edge. */
export interface FigureBars {
  readonly x: ArrayLike<number>;
  readonly counts: ArrayLike<number>;
}

/** A curve plot with what belongs to it. */
export interface LineFigure {
  readonly title: string;
  readonly x: FigureAxis;
  readonly y: FigureAxis;
  readonly lines: readonly PlottedLine[];
  readonly levels?: readonly FigureLevel[];
  readonly bars?: FigureBars;
  /** Place among the samples of the first line that is marked and named. */
  readonly chosen?: { readonly at: number; readonly label: string };
}
