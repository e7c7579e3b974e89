"use client";

import type { ComponentProps } from "react";
import { classNames } from "./class-names";
import { CONTROL_LOOK } from "./control-look";
import { useFieldWiring } from "./field-wiring";

/** Several lines of text. */
export function TextArea({ className, required, rows = 3, ...rest }: ComponentProps<"textarea">) {
  const wiring = useFieldWiring({ required, ...rest });
  return <textarea rows={rows} {...rest} {...wiring} className={classNames(CONTROL_LOOK, className)} />;
}
