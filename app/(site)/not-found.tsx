import { NotFoundForm } from '@/components/shell/blank-pages';

/** Here as well as at the root, so that the tabs stay above it. */
export default function SiteNotFound() {
  return (
    <div className="px-4">
      <NotFoundForm />
    </div>
  );
}
