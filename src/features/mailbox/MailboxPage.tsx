import { useQuery } from "@tanstack/react-query";
import { Fragment, useState } from "react";
import type { MailRow } from "../../../shared/schemas/invitation";
import { Button, ButtonLink } from "../../components/Button";
import { PageHead } from "../../components/PageHead";
import { ErrorNote, Loading } from "../../components/status";
import { Empty, Note } from "../../components/text";
import { classes } from "../../lib/classes";
import { counted, fullTime, savedAt } from "../../lib/format";
import { allRows } from "../../lib/pages";
import { keys } from "../../lib/queries";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";

const stateWords: Readonly<Record<MailRow["state"], string>> = {
  kept: "kept here",
  sent: "sent",
  failed: "not sent",
};

/** The letters of this server. Without a mail server they end here, to be read and passed on. */
export default function MailboxPage() {
  usePageTitle("Letters");
  return useMay("manageMembers") ? (
    <Mailbox />
  ) : (
    <div className="px-5">
      <Empty title="For administrators">Letters carry links that open accounts.</Empty>
    </div>
  );
}

function Mailbox() {
  const letters = useQuery({
    queryKey: keys.letters,
    queryFn: ({ signal }) => allRows<MailRow>("/outbox", signal),
    staleTime: 0,
  });
  const [chosen, setChosen] = useState<string>();
  const rows = letters.data ?? [];
  const letter = rows.find(({ id }) => id === chosen) ?? rows[0];
  return (
    <>
      <PageHead
        title="Letters"
        about={
          <Note>
            {letters.data && counted(rows.length, "letter")}
            {rows.some(({ state }) => state === "kept") && ". No mail server is set up: kept letters are read here."}
          </Note>
        }
      >
        <Button onClick={() => void letters.refetch()}>Look again</Button>
        <ButtonLink to="/members">Members</ButtonLink>
      </PageHead>
      {letters.error ? (
        <div className="measure p-5">
          <ErrorNote doing="The letters could not be read" error={letters.error} retry={() => void letters.refetch()} />
        </div>
      ) : !letters.data ? (
        <div className="px-5">
          <Loading label="Reading the letters" />
        </div>
      ) : letter === undefined ? (
        <div className="px-5">
          <Empty title="No letter yet" action={<ButtonLink to="/members">To the members</ButtonLink>}>
            Invitations are written here before they are sent.
          </Empty>
        </div>
      ) : (
        <div className="flex min-h-0 flex-1">
          <ol aria-label="Letters" className="w-[320px] shrink-0 overflow-y-auto border-r border-rule lg:w-[420px]">
            {rows.map((row) => (
              <li key={row.id} className="hairline">
                <button
                  type="button"
                  aria-pressed={row === letter}
                  onClick={() => setChosen(row.id)}
                  className={classes("w-full px-5 py-2 text-left hover:bg-tint/50", row === letter && "bg-tint!")}
                >
                  <span className="flex items-baseline justify-between gap-3">
                    <b className="truncate">{row.to}</b>
                    <time className="shrink-0 text-sm text-muted" dateTime={row.createdAt}>
                      {savedAt(row.createdAt)}
                    </time>
                  </span>
                  <span className="flex items-baseline justify-between gap-3 text-sm">
                    <span className="truncate">{row.subject}</span>
                    <span className={classes("shrink-0", row.state === "failed" ? "text-signal" : "text-muted")}>
                      {stateWords[row.state]}
                    </span>
                  </span>
                </button>
              </li>
            ))}
          </ol>
          <Letter letter={letter} />
        </div>
      )}
    </>
  );
}

function Letter({ letter }: { letter: MailRow }) {
  return (
    <article aria-label="Letter" className="min-w-0 flex-1 overflow-y-auto px-8 py-5">
      <h2 className="text-lg">{letter.subject}</h2>
      <p className="text-sm text-muted">
        To {letter.to}, {fullTime(letter.createdAt)}.{" "}
        {letter.state === "sent" && letter.sentAt !== null && `Handed to the mail server ${fullTime(letter.sentAt)}.`}
        {letter.state === "kept" && "Kept here: no mail server is set up."}
      </p>
      {letter.error !== null && (
        <ErrorNote className="mt-3" doing="The mail server did not take it" error={new Error(letter.error)} />
      )}
      <div className="measure mt-4 border-t border-ink pt-4 break-words whitespace-pre-wrap">
        <Linked text={letter.text} />
      </div>
    </article>
  );
}

/** Addresses in the text as links; those of this server open here. */
const Linked = ({ text }: { text: string }) => (
  <>
    {text.split(/(https?:\/\/\S+)/).map((part, i) =>
      /^https?:\/\//.test(part) ? (
        <a key={i} href={part} className="font-mono text-sm text-verdigris">
          {part}
        </a>
      ) : (
        <Fragment key={i}>{part}</Fragment>
      ),
    )}
  </>
);
