import { PageHeader } from '../../components/page-header';
import { KeySheet } from '../../features/help/components/key-sheet';

/** Every key, and the switch for single letters. */
export function KeysPage() {
  return (
    <div className="sp-page sp-reading">
      <PageHeader title="Keys" />
      <KeySheet />
    </div>
  );
}
