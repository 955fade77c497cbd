import { Button, ButtonLink } from "../components/Button";
import { messageOf } from "../lib/failure";
import { usePageTitle } from "../lib/title";

/** A screen that failed says what happened and offers the way back; the rest of the application stands. */
export function RouteError({ error }: { error: unknown }) {
  const outdated = error instanceof TypeError && /import|module/i.test(error.message);
  usePageTitle("Something went wrong");
  return (
    <div className="measure px-5 py-10">
      <h1 className="text-lg">This screen could not be shown</h1>
      <p className="mt-2">
        {outdated
          ? "A part of the application could not be fetched: either the server does not answer, or a newer version was installed since this page was opened."
          : messageOf(error)}
      </p>
      <div className="mt-5 flex gap-3">
        <Button onClick={() => window.location.reload()}>Load again</Button>
        <ButtonLink to="/plans" kind="primary">
          To the plans
        </ButtonLink>
      </div>
    </div>
  );
}
