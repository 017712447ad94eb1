import { PageHeader } from '../../components/page-header';
import { AccessibilityStatement } from '../../features/help/components/accessibility-statement';

/** For whom it works, how that is known, and where it falls short. */
export function AccessibilityPage() {
  return (
    <div className="sp-page sp-reading">
      <PageHeader title="Accessibility" />
      <AccessibilityStatement />
    </div>
  );
}
