import { Link } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';

/** An address without a page. */
export function NotFoundPage() {
  return (
    <div className="sp-page">
      <PageHeader title="No page here" />
      <p>
        The address has no page in this installation. It may have been typed wrong, or the page was moved.
      </p>
      <p>
        <Link to="/">Go to your first page</Link>
      </p>
    </div>
  );
}
