import { BarePage } from '@/components/shell/bare-page';
import { NotFoundForm } from '@/components/shell/blank-pages';

export default function NotFound() {
  return (
    <BarePage>
      <NotFoundForm />
    </BarePage>
  );
}
