import { Link } from "react-router-dom";
import type { Session } from "#shared/contracts/accounts.ts";
import { Menu } from "../ui/menu.tsx";
import { Segmented } from "../ui/segmented.tsx";

export interface MenuLink {
  label: string;
  to: string;
  /** A file the server sends, not a page. */
  download?: boolean;
}

export interface ShopMenuProps {
  session: Pick<Session, "user" | "shop" | "admin" | "units" | "theme">;
  links: readonly MenuLink[];
  onUnits: (units: Session["units"]) => void;
  onTheme: (theme: Session["theme"]) => void;
  onSignOut: () => unknown;
}

const unitChoices = [
  { value: "metric", label: "mm, bar" },
  { value: "inch", label: "in, psi" },
] as const;
const themeChoices = [
  { value: "system", label: "Device" },
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
] as const;
const unitWord = { metric: "mm", inch: "in" };

export function ShopMenu({ session, links, onUnits, onTheme, onSignOut }: ShopMenuProps) {
  const where = session.shop?.name ?? (session.admin ? "Network" : (session.user?.name ?? ""));
  const name = session.shop ? `${where} · ${unitWord[session.units]}` : where;
  return (
    <Menu label={name} accessibleName={`${name}: menu`}>
      {(close) => (
        <div className="space-y-1">
          <p className="px-3 pt-1 pb-2 text-sm text-muted">
            {session.user?.name}
            {session.shop ? `, ${session.shop.role}` : null}
          </p>
          {links.map((link) => (
            <MenuEntry key={link.to} link={link} onFollow={close} />
          ))}
          <div className="space-y-3 border-y border-line px-3 py-3">
            <Segmented label="Units" choices={unitChoices} value={session.units} onChange={onUnits} />
            <Segmented label="Theme" choices={themeChoices} value={session.theme} onChange={onTheme} />
          </div>
          <button type="button" onClick={onSignOut} className={entryClasses}>
            Sign out
          </button>
        </div>
      )}
    </Menu>
  );
}

const entryClasses =
  "flex min-h-10 w-full items-center rounded px-3 text-left font-bold text-ink hover:bg-action-soft pointer-coarse:min-h-touch";

function MenuEntry({ link, onFollow }: { link: MenuLink; onFollow: () => void }) {
  if (link.download) {
    return (
      <a href={link.to} download onClick={onFollow} className={entryClasses}>
        {link.label}
      </a>
    );
  }
  return (
    <Link to={link.to} onClick={onFollow} className={entryClasses}>
      {link.label}
    </Link>
  );
}
