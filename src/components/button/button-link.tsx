import Link from "next/link";
import type { ComponentProps } from "react";
import { buttonLook, type ButtonKind } from "./button-look";

type Props = Omit<ComponentProps<typeof Link>, "className" | "style"> & { kind?: ButtonKind; full?: boolean };

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function ButtonLink({ kind = "plain", full, ...rest }: Props) {
  return <Link {...rest} className={buttonLook(kind, full)} />;
}
