import { useState } from "react";
import { Menu, MenuChoice, MenuItem, MenuLabel, MenuSeparator } from "../components/Menu";
import { PotentialScaleDialog } from "../components/PotentialScaleDialog";
import { usePotentialScale } from "../lib/potential";
import { usePreferences } from "../lib/preferences";
import { useSession, useSignOut } from "../lib/session";

const themes = [
  { value: "system", label: "As the system" },
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
] as const;

/** Who is signed in, and what they keep to themselves: theme, potential scale, signing out. */
export function MemberMenu() {
  const { user } = useSession();
  const [preferences, change] = usePreferences();
  const { label } = usePotentialScale();
  const signOut = useSignOut();
  const [scaleOpen, setScaleOpen] = useState(false);
  return (
    <>
      <Menu
        trigger={
          <button type="button" className="flex items-center hover:text-verdigris">
            {user.role}
          </button>
        }
      >
        <div className="px-3 pt-1 pb-2">
          <p className="font-bold">{user.name}</p>
          <p className="text-sm text-muted">{user.email}</p>
        </div>
        <MenuSeparator />
        <MenuLabel>Theme</MenuLabel>
        <MenuChoice stays value={preferences.theme} onChange={(theme) => change({ theme })} options={themes} />
        <MenuSeparator />
        <MenuItem onSelect={() => setScaleOpen(true)} note={label}>
          Potential scale …
        </MenuItem>
        <MenuSeparator />
        <MenuItem onSelect={() => signOut.mutate()}>Sign out</MenuItem>
      </Menu>
      <PotentialScaleDialog open={scaleOpen} onOpenChange={setScaleOpen} />
    </>
  );
}
