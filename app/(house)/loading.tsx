import { LoadingState } from '../_components/ui/states';

export default function Loading() {
  return <LoadingState />;
}
