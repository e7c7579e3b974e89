"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { buttonLook } from "@/components/ui/button-look";
import { Actions } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { LiveRegion } from "@/components/ui/live-region";
import { Notice } from "@/components/ui/notice";
import { TextInput } from "@/components/ui/text-input";
import { QrCode } from "./qr-code";
import { schemeOf, webcalOf } from "./feed-words";

/** A new address in every form a device takes. It is shown here and never again. */
export function FeedAddress({
  address,
  onClose,
}: {
  readonly address: string;
  readonly onClose: () => void;
}) {
  const [copied, setCopied] = useState("");
  const webcal = webcalOf(address);
  const copy = async (): Promise<void> => {
    // Without permission, or without https, the field is there to copy from by hand.
    const done = await navigator.clipboard?.writeText(address).then(
      () => true,
      () => false,
    );
    setCopied(done ? "Copied." : "Select the address and copy it.");
  };
  return (
    <>
      <Notice tone="caution" title="This address is shown once.">
        Who has it can read this calendar. If it gets into the wrong hands, renew or end the subscription.
      </Notice>
      <div className="mt-4 flex flex-wrap gap-5">
        <figure>
          <QrCode text={webcal} label="QR code of the calendar's address" />
          <figcaption className="mt-1 text-xs text-ink-2">Point the phone&rsquo;s camera at it.</figcaption>
        </figure>
        <div className="flex min-w-52 flex-1 flex-col items-start gap-2">
          <a href={webcal} className={buttonLook({ variant: "primary" })}>
            Open in the calendar
          </a>
          <Button onClick={() => void copy()}>Copy the address</Button>
          {copied ? (
            <p aria-hidden="true" className="text-sm font-semibold">
              {copied}
            </p>
          ) : null}
          <a href={address} download="bellward.ics" className={buttonLook({ variant: "plain" })}>
            Download once
          </a>
          <p className="text-xs text-ink-2">A download does not follow changes; the subscription does.</p>
        </div>
      </div>
      <Field
        label={`${schemeOf(address)} address`}
        hint="For calendars that ask for one: add a calendar by URL."
        className="mt-4"
      >
        <TextInput readOnly value={address} onFocus={(event) => event.target.select()} />
      </Field>
      <Field
        label="webcal address"
        hint="The same, under the name that calendar apps answer to."
        className="mt-3"
      >
        <TextInput readOnly value={webcal} onFocus={(event) => event.target.select()} />
      </Field>
      <LiveRegion>{copied}</LiveRegion>
      <Actions>
        <Button onClick={onClose}>Done</Button>
      </Actions>
    </>
  );
}
