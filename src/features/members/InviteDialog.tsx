import { zodResolver } from "@hookform/resolvers/zod";
import { useForm, useWatch } from "react-hook-form";
import { Link } from "react-router-dom";
import type { z } from "zod";
import { invitationCreate, type InvitationRow } from "../../../shared/schemas/invitation";
import { FormDialog } from "../../components/FormDialog";
import { SelectField } from "../../components/SelectField";
import { ErrorNote } from "../../components/status";
import { TextArea, TextField } from "../../components/TextField";
import { useInvite } from "./members";
import { roleOptions } from "./memberWords";

interface InviteDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

/** A letter with a link that opens one account, once. */
export function InviteDialog(props: InviteDialogProps) {
  return props.open ? <Invite {...props} /> : null;
}

function Invite({ open, onOpenChange }: InviteDialogProps) {
  const invite = useInvite();
  const form = useForm<z.input<typeof invitationCreate>, unknown, z.output<typeof invitationCreate>>({
    resolver: zodResolver(invitationCreate),
    defaultValues: { email: "", role: "technician", message: "" },
  });
  const submit = form.handleSubmit((values) => invite.mutate(values));
  const { errors } = form.formState;
  const role = useWatch({ control: form.control, name: "role" });
  return (
    <FormDialog
      open={open}
      onOpenChange={onOpenChange}
      {...(invite.data
        ? { title: "Invited", came: <Came {...invite.data} /> }
        : {
            title: "Invite a member",
            description:
              "They get a letter with a link, choose their name and password, and are in. The link works once and expires.",
          })}
      action={invite.isPending ? "Sending …" : "Send the letter"}
      disabled={invite.isPending}
      onSubmit={(event) => void submit(event)}
    >
      <TextField
        label="E-mail"
        type="email"
        autoComplete="off"
        autoFocus
        error={errors.email && "An e-mail address, such as name@site.example"}
        {...form.register("email")}
      />
      <SelectField
        control={form.control}
        name="role"
        label="Role"
        options={roleOptions}
        hint={roleOptions.find(({ value }) => value === role)?.note}
      />
      <TextArea
        label="A line of your own, if you like"
        error={errors.message && "At most 500 characters"}
        {...form.register("message")}
      />
      {invite.error && <ErrorNote doing="Not invited" error={invite.error} />}
    </FormDialog>
  );
}

/** What became of the letter. */
function Came({ email, mail }: Pick<InvitationRow, "email" | "mail">) {
  if (mail?.state === "sent")
    return (
      <p>
        A letter went to <b>{email}</b>. Its link works once.
      </p>
    );
  if (mail?.state === "failed")
    return (
      <ErrorNote
        doing={`The letter to ${email} was not taken`}
        error={new Error(`${mail.error ?? "The mail server refused it"}. The invitation stands; send it again.`)}
      />
    );
  return (
    <p>
      No mail server is set up here: the letter to <b>{email}</b> is kept on this server. Read it in the{" "}
      <Link to="/mailbox">mailbox</Link> and pass the link on; it works once.
    </p>
  );
}
