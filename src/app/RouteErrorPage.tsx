import { useRouteError } from 'react-router-dom';
import { ProblemPage } from '../http/ProblemPage.tsx';

/** What a broken page shows instead of itself. */
export function RouteErrorPage() {
  const error = useRouteError();
  return <ProblemPage error={error} onRetry={() => window.location.reload()} />;
}
