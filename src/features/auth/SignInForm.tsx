import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { signIn } from "../../../shared/schemas/member";
import { Button } from "../../components/Button";
import { ErrorNote } from "../../components/status";
import { TextField } from "../../components/TextField";
import { useSignIn } from "../../lib/session";

/** Address and password. `email` given: that member comes back to a page that is still open. */
export default function SignInForm({ email = "", password = "" }: { email?: string; password?: string }) {
  const enter = useSignIn();
  const form = useForm<z.infer<typeof signIn>>({ resolver: zodResolver(signIn), values: { email, password } });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) => enter.mutate(values));
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="space-y-4">
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        autoFocus={email === ""}
        error={errors.email && "An e-mail address, such as name@site.example"}
        {...form.register("email")}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        autoFocus={email !== ""}
        error={errors.password && "The password is needed"}
        {...form.register("password")}
      />
      {enter.error && <ErrorNote error={enter.error} />}
      <Button type="submit" kind="primary" disabled={enter.isPending}>
        {enter.isPending ? "Signing in …" : "Sign in"}
      </Button>
    </form>
  );
}
