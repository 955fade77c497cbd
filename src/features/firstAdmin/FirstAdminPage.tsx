import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { firstAdmin } from "../../../shared/schemas/member";
import { Button } from "../../components/Button";
import { ErrorNote } from "../../components/status";
import { SectionHead } from "../../components/text";
import { TextField } from "../../components/TextField";
import { useFirstAdmin } from "../../lib/session";
import { usePageTitle } from "../../lib/title";

/** Shown once, while the database knows nobody. */
export default function FirstAdminPage() {
  usePageTitle("First administrator");
  const create = useFirstAdmin();
  const form = useForm<z.infer<typeof firstAdmin>>({
    resolver: zodResolver(firstAdmin),
    defaultValues: { email: "", name: "", password: "" },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) => create.mutate(values));
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="flex h-11 shrink-0 items-center border-b border-ink px-5">
        <h1 className="text-lg">Gangueway</h1>
      </header>
      <main className="w-full max-w-[480px] px-5 pt-[9vh] pb-10">
        <p className="text-muted">
          Nobody is registered here yet. The first member is the administrator, who sees to members and settings. This
          page does not come back afterwards.
        </p>
        <SectionHead className="mt-8">First administrator</SectionHead>
        <form onSubmit={(event) => void submit(event)} noValidate className="space-y-4 pt-4">
          <TextField
            label="Name"
            autoComplete="name"
            autoFocus
            error={errors.name && "A name, as colleagues know you"}
            {...form.register("name")}
          />
          <TextField
            label="E-mail"
            type="email"
            autoComplete="username"
            error={errors.email && "An e-mail address, such as name@site.example"}
            {...form.register("email")}
          />
          <TextField
            label="Password"
            type="password"
            autoComplete="new-password"
            {...(errors.password ? {} : { hint: "At least 12 characters; a few unrelated words do well." })}
            error={errors.password?.message}
            {...form.register("password")}
          />
          {create.error && <ErrorNote error={create.error} />}
          <Button type="submit" kind="primary" disabled={create.isPending}>
            {create.isPending ? "Creating …" : "Create and sign in"}
          </Button>
        </form>
      </main>
    </div>
  );
}
