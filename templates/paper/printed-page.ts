import type { Ink } from './ink';

/** A page ready to be drawn, with the names that links and bookmarks reach it by. */
export type PrintedPage = {
  readonly ink: readonly Ink[];
  /** Page label of the file: "S-03.2", "cover". */
  readonly label: string;
  readonly destinations: readonly { readonly name: string; readonly y: number }[];
  readonly bookmarks: readonly Bookmark[];
};

/** Level 0 is a sheet or a page of its own, level 1 a section, which the index lists with its rich title. */
export type Bookmark = {
  readonly title: string;
  readonly level: 0 | 1;
  readonly y: number;
  readonly section?: { readonly id: string; readonly title: string };
};

/** A file attached as the machine-readable form of what is printed (ISO 32000-2, 14.13: associated file, Data). */
export type AttachedData = {
  readonly name: string;
  readonly description: string;
  readonly bytes: Uint8Array;
};

export type PrintedDocument = {
  readonly title: string;
  readonly author: string;
  readonly subject: string;
  readonly language: 'en-US' | 'en-GB';
  /** The moment printed into the file; the same moment gives the same bytes. */
  readonly date: Date;
  readonly size: 'Letter' | 'A4';
  readonly pages: readonly PrintedPage[];
  readonly data?: AttachedData;
};
