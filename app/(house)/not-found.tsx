import { EmptyState } from '../_components/ui/states';

export default function NotFound() {
  return (
    <EmptyState title="There is nothing here">
      It may have been deleted, or belong to another house, or your role does not show it.
    </EmptyState>
  );
}
