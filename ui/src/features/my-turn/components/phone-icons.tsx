import type { ReactNode } from 'react';

/** A sign of the phone pages, drawn in ink on a 24 grid. Words always stand beside it. */
function Sign({ children, size = 24 }: { children: ReactNode; size?: number | undefined }) {
  return (
    <svg
      viewBox="0 0 24 24"
      width={size}
      height={size}
      aria-hidden="true"
      focusable="false"
      fill="none"
      stroke="currentColor"
      strokeWidth={2}
    >
      {children}
    </svg>
  );
}

interface SignProps {
  /** Edge length in CSS pixels, 24 by default. */
  size?: number;
}

export const OnwardSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M9 5l7 7-7 7" />
  </Sign>
);

export const UndoSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M8 4L3 9l5 5M3.500 9H15a5.500 5.500 0 0 1 0 11H9" />
  </Sign>
);

export const EraseSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M8 5h14v14H8l-6-7zM12 9l6 6M18 9l-6 6" />
  </Sign>
);

/** An entry that is on the phone only. */
export const OnPhoneSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M7 2h10v20H7zM10.500 18.500h3" />
  </Sign>
);

/** An entry that has its receipt. */
export const SentSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M3 2h9v20H3zM6 18.500h3M12 9h9M17 5l4 4-4 4" />
  </Sign>
);

/** An entry that somebody at the desk has had before them. */
export const SeenSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path fill="currentColor" d="M2 4h20v12H2z" />
    <path d="M12 16v4M6 21h12" />
  </Sign>
);

export const RadioSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M6 9h12v13H6zM15 9V1M10 13h4M10 17.500h4" />
  </Sign>
);

export const LaterSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M12 3a9 9 0 1 0 .01 0zM12 7v5.500l4 2" />
  </Sign>
);

/** The railroad's own words: a card with lines. */
export const CardSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M4 3h16v18H4zM8 8.500h8M8 12.500h8M8 16.500h5" />
  </Sign>
);

/** Seen to. */
export const DoneSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path strokeWidth={3} d="M4 12.500l5.500 5.500L20 6" />
  </Sign>
);

/** Not seen to yet. */
export const HollowSign = ({ size }: SignProps) => (
  <Sign size={size}>
    <path d="M4 4h16v16H4z" />
  </Sign>
);

/** Something is open and somebody must act: the filled triangle of the board. */
export const OpenSign = ({ size }: SignProps) => (
  <svg viewBox="0 0 24 24" width={size ?? 24} height={size ?? 24} aria-hidden="true" focusable="false">
    <path fill="currentColor" d="M12 2L23 22H1z" />
  </svg>
);
