import { zodResolver } from "@hookform/resolvers/zod";
import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useForm } from "react-hook-form";
import { useNavigate, useParams } from "react-router-dom";
import type { z } from "zod";
import { invitationAccept, type InvitationOffer } from "../../../shared/schemas/invitation";
import type { SessionAnswer } from "../../../shared/schemas/member";
import { Button, ButtonLink } from "../../components/Button";
import { ErrorNote, Loading } from "../../components/status";
import { Note, SectionHead } from "../../components/text";
import { TextField } from "../../components/TextField";
import { api } from "../../lib/api";
import { ApiFailure } from "../../lib/failure";
import { fullTime } from "../../lib/format";
import { keys } from "../../lib/queries";
import { useSessionQuery } from "../../lib/session";
import { usePageTitle } from "../../lib/title";

/** Refused for good: not the server's silence (0), its own fault, or too many attempts for now. */
const staysSo = (error: unknown): boolean =>
  error instanceof ApiFailure && error.status >= 400 && error.status < 500 && error.status !== 429;

/** Behind the link of an invitation: choose a name and a password, and be in. Open to those who are not signed in. */
export default function InvitationPage() {
  usePageTitle("Invitation");
  const { token = "" } = useParams();
  const offer = useQuery({
    queryKey: keys.invitation(token),
    queryFn: ({ signal }) => api.get<InvitationOffer>(`/invitations/${encodeURIComponent(token)}`, { signal }),
    retry: false,
  });
  return (
    <main className="mx-auto max-w-[440px] px-6 py-[10vh]">
      <p className="font-mono text-xl font-bold">Gangueway</p>
      {offer.error ? (
        <>
          <ErrorNote
            className="mt-6"
            doing="This link opens nothing"
            error={offer.error}
            // A link that is used up, taken back or cut short stays so.
            {...(staysSo(offer.error) ? {} : { retry: () => void offer.refetch() })}
          />
          <div className="mt-6">
            <ButtonLink to="/">To the sign-in</ButtonLink>
          </div>
        </>
      ) : !offer.data ? (
        <Loading label="Reading the invitation" />
      ) : (
        <Accept token={token} offer={offer.data} />
      )}
    </main>
  );
}

function Accept({ token, offer }: { token: string; offer: InvitationOffer }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const session = useSessionQuery().data;
  const accept = useMutation({
    mutationFn: (body: z.output<typeof invitationAccept>) =>
      api.post<SessionAnswer>(`/invitations/${encodeURIComponent(token)}/accept`, body),
    onSuccess: (answer) => {
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== "session" });
      client.setQueryData(keys.sessionEnded, false);
      client.setQueryData(keys.session, answer);
      void navigate("/", { replace: true });
    },
  });
  const form = useForm<z.input<typeof invitationAccept>, unknown, z.output<typeof invitationAccept>>({
    resolver: zodResolver(invitationAccept),
    defaultValues: { name: "", password: "" },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) => accept.mutate(values));
  return (
    <>
      <p className="mt-3">
        {offer.invitedBy} invites <b>{offer.email}</b> to plan and record process windows here, as <b>{offer.role}</b>.
      </p>
      <Note className="mt-1">The link works once, until {fullTime(offer.expiresAt)}.</Note>
      {session?.user && (
        <Note className="mt-2">
          You are signed in as {session.user.name}; accepting signs you out there and in as the new member.
        </Note>
      )}
      <SectionHead className="mt-8">Your account</SectionHead>
      <form onSubmit={(event) => void submit(event)} noValidate className="space-y-4 pt-4">
        <TextField label="E-mail" value={offer.email} readOnly autoComplete="username" />
        <TextField
          label="Name"
          autoComplete="name"
          autoFocus
          error={errors.name && "A name, as colleagues know you"}
          {...form.register("name")}
        />
        <TextField
          label="Password"
          type="password"
          autoComplete="new-password"
          hint="At least 12 characters; a few unrelated words do well."
          error={errors.password?.message}
          {...form.register("password")}
        />
        {accept.error && <ErrorNote doing="Not accepted" error={accept.error} />}
        <Button type="submit" kind="primary" disabled={accept.isPending}>
          {accept.isPending ? "Opening …" : "Accept and sign in"}
        </Button>
      </form>
    </>
  );
}
