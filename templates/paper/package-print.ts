import type { Block } from '../block';
import type { PaperMode, SignOff } from './imprint';
import type { PaperSize } from './page-geometry';
import type { AttachedData, PrintedDocument } from './printed-page';
import type { PrintedSheet } from './set-sheet';

export type Person = { readonly name: string; readonly initials: string };

/** What a sheet of a package has beside its content. */
type Issued = {
  readonly revision: number;
  readonly originator: SignOff;
  readonly checker?: SignOff;
  /** First digits of the revision's digest. */
  readonly digest?: string;
  /** Against the submittal before: a new sheet, or one of a later revision. */
  readonly since?: 'new' | 'changed';
};

/** A calculated sheet, or an attached document whose own pages are framed. */
export type PackageSheet = Issued &
  (
    | (PrintedSheet & { readonly kind: 'calculated' })
    | {
        readonly kind: 'attached';
        readonly number: string;
        readonly title: string;
        /** A PDF file that has passed the checks of uploads. */
        readonly file: Uint8Array;
      }
  );

/** Everything that goes into a package. Dates are given, so that the same package gives the same bytes. */
export type PackagePrint = {
  readonly office: string;
  readonly job: {
    readonly number: string;
    readonly title: string;
    readonly place?: string;
    readonly client?: string;
    readonly authority?: string;
    readonly codes?: readonly string[];
  };
  /** What the cover says under its title: "Submittal 2, for approval". */
  readonly purpose: string;
  /** Number of the submittal, if it is one. */
  readonly submittal?: number;
  /** The submittal that changes are flagged against. */
  readonly previous?: number | undefined;
  readonly mode: PaperMode;
  readonly size: PaperSize;
  readonly language: PrintedDocument['language'];
  readonly date: Date;
  readonly digest?: string;
  readonly people: {
    readonly originators: readonly Person[];
    readonly checkers: readonly Person[];
    readonly engineer?: Person;
  };
  readonly sheets: readonly PackageSheet[];
  /** Governing results and assumptions, set before the cautions on the last pages. */
  readonly closing?: readonly Block[];
  /** Shapes in the margin of the closing lines, such as a checker's marks. */
  readonly closingMarks?: PrintedSheet['marks'];
  /** Where a seal goes, and the sheets it covers: "S-01 to S-06". */
  readonly seal?: { readonly on: 'cover' | 'every-page'; readonly covers: string };
  readonly data?: AttachedData;
  /** Address of the page where anybody can verify the file. */
  readonly verifyAt?: string;
};

/** A square for the visible seal, in the page's own points from its lower left corner. */
export type SealPlace = {
  readonly page: number;
  readonly x: number;
  readonly y: number;
  readonly size: number;
};

export type PrintedPackage = {
  readonly bytes: Uint8Array;
  /** Label of each page, and the sheet it belongs to. */
  readonly pages: readonly { readonly label: string; readonly sheet?: string }[];
  readonly sealPlaces: readonly SealPlace[];
};
