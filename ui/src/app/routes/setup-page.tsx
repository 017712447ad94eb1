import { PageHeader } from '../../components/page-header';

/** Heading alone, until the parts of the page stand. */
export function SetupPage() {
  return <PageHeader title="Setup" />;
}
