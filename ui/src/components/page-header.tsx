import { useEffect, type ReactNode } from 'react';

/** Heading of a page, its name in the browser's tab, and what stands at the right of it. */
export function PageHeader({
  title,
  children,
  hidden = false,
}: {
  title: string;
  /** Views or actions at the right. */
  children?: ReactNode;
  /** For pages whose heading is only read out. */
  hidden?: boolean;
}) {
  useEffect(() => {
    document.title = `${title} · Stubpost`;
  }, [title]);
  if (hidden) return <h1 className="unseen">{title}</h1>;
  return (
    <div className="sp-title">
      <h1>{title}</h1>
      {children}
    </div>
  );
}
