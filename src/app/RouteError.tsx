import { isRouteErrorResponse, useRouteError } from "react-router-dom";
import { Button, ButtonLink } from "../components/Button";
import { messageOf } from "../lib/failure";
import { usePageTitle } from "../lib/title";

/** A screen that failed says what happened and offers the way back; the rest of the application stands. */
export function RouteError() {
  const error = useRouteError();
  const missing = isRouteErrorResponse(error) && error.status === 404;
  const outdated = error instanceof TypeError && /import|module/i.test(error.message);
  usePageTitle(missing ? "Not found" : "Something went wrong");
  return (
    <div className="measure px-5 py-10">
      <h1 className="text-lg">{missing ? "There is nothing at this address" : "This screen could not be shown"}</h1>
      <p className="mt-2">
        {missing
          ? "The link may be old, or mistyped."
          : outdated
            ? "A part of the application could not be fetched: either the server does not answer, or a newer version was installed since this page was opened."
            : messageOf(error)}
      </p>
      <div className="mt-5 flex gap-3">
        {!missing && <Button onClick={() => window.location.reload()}>Load again</Button>}
        <ButtonLink to="/plans" kind="primary">
          To the plans
        </ButtonLink>
      </div>
    </div>
  );
}
