import { ExportsList } from '../features/exports/exports-list';

export function Component() {
  return <ExportsList />;
}
