import { useEffect, useRef } from 'react';

/** One thing wrong in a form, and the field to mend it. */
export interface FieldProblem {
  fieldId: string;
  words: string;
}

/** What is wrong, on top of a form, with links to the fields. Takes the focus when it comes. */
export function FieldSummary({ problems, title }: { problems: readonly FieldProblem[]; title?: string }) {
  const box = useRef<HTMLDivElement>(null);
  const hasProblems = problems.length > 0;
  useEffect(() => {
    if (hasProblems) box.current?.focus();
  }, [hasProblems, problems]);
  if (!hasProblems) return null;
  return (
    <div className="sp-problems" role="alert" tabIndex={-1} ref={box}>
      <b>{title ?? (problems.length === 1 ? 'One thing to mend' : `${problems.length} things to mend`)}</b>
      <ul>
        {problems.map(({ fieldId, words }) => (
          <li key={fieldId + words}>
            <a href={`#${fieldId}`} onClick={(event) => focusField(event, fieldId)}>
              {words}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}

function focusField(event: React.MouseEvent, fieldId: string): void {
  event.preventDefault();
  document.getElementById(fieldId)?.focus();
}
