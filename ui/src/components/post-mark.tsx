/** The mark of Stubpost: the bumping post, a short rail running to it, and the open end. */
export function PostMark({ size = 22 }: { size?: number }) {
  return (
    <svg viewBox="0 0 22 20" width={size} height={(size * 20) / 22} aria-hidden="true" focusable="false">
      <path
        fill="currentColor"
        d="M1 0H6.5V20H1zM6.5 8.25H13.5V11.75H6.5zM15.5 8.25H18V11.75H15.5zM20 8.25H21.5V11.75H20z"
      />
    </svg>
  );
}
