import { Banner } from '@/components/ui/banner';
import { type ApiError } from '@/hooks/client/api-error';

/** Why an account form was refused; problems of single fields stand beside those fields. */
export function AccountRefusal({ error }: { error: ApiError | null }) {
  if (error === null || error.problems.some((problem) => problem.field !== '')) return null;
  return <Banner kind="rust" title={error.message} text={error.action} />;
}
