import { ButtonLink } from "../components/Button";
import { Empty } from "../components/text";
import { usePageTitle } from "../lib/title";

export default function NotFoundPage() {
  usePageTitle("Not found");
  return (
    <div className="px-5">
      <Empty title="There is nothing at this address" action={<ButtonLink to="/plans">To the plans</ButtonLink>}>
        The link may be old, or mistyped.
      </Empty>
    </div>
  );
}
