import { BrowserRouter } from 'react-router-dom';
import { WorkbenchPage } from './workbench/WorkbenchPage.tsx';

export function App() {
  return (
    <BrowserRouter>
      <WorkbenchPage />
    </BrowserRouter>
  );
}
