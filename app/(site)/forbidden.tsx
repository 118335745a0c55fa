import { ForbiddenForm } from '@/components/shell/blank-pages';

/** Here as well as at the root, so that the tabs stay above it. */
export default function SiteForbidden() {
  return (
    <div className="px-4">
      <ForbiddenForm />
    </div>
  );
}
