/** The outline of a glyph, beside what the typesetter's declarations say of fontkit. */
declare module 'fontkit' {
  interface FontkitPathCommand {
    readonly command: 'moveTo' | 'lineTo' | 'quadraticCurveTo' | 'bezierCurveTo' | 'closePath';
    readonly args: readonly number[];
  }
  interface FontkitGlyph {
    readonly path: { readonly commands: readonly FontkitPathCommand[] };
  }
}
