import { BarePage } from '@/components/shell/bare-page';
import { ForbiddenForm } from '@/components/shell/blank-pages';

export default function Forbidden() {
  return (
    <BarePage>
      <ForbiddenForm />
    </BarePage>
  );
}
