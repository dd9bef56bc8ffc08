'use client';

import { type ReactNode, useEffect, useRef } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Mark } from '@/app/_components/ui/mark';

interface FormFrameProps {
  errors: Record<string, string>;
  fault: string | null;
  isSaving: boolean;
  isDirty: boolean;
  /** "Save material". */
  saveWords: string;
  onSubmit: () => void;
  onCancel: () => void;
  /** Further actions at the foot, such as deleting. */
  more?: ReactNode;
  children: ReactNode;
}

/** The form around its parts: what is wrong is summed up above, and saving stays in sight below. */
export function FormFrame(props: FormFrameProps) {
  const { errors, fault, isSaving, isDirty, saveWords, onSubmit, onCancel, more, children } = props;
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        onSubmit();
      }}
    >
      <Summary errors={errors} fault={fault} />
      {children}
      <div className="sticky bottom-14 z-10 flex flex-wrap items-center gap-3 border-t border-ink bg-paper px-5 py-3 md:bottom-0 md:px-8">
        <Button type="submit" look="solid" disabled={isSaving}>
          {isSaving ? 'Saving' : saveWords}
        </Button>
        <Button onClick={onCancel}>Cancel</Button>
        {isDirty ? <Mark state="draft" /> : null}
        <span className="ml-auto">{more}</span>
      </div>
    </form>
  );
}

function Summary({ errors, fault }: { errors: Record<string, string>; fault: string | null }) {
  const box = useRef<HTMLDivElement>(null);
  const entries = Object.entries(errors);
  const shown = fault ?? entries.map(([path]) => path).join();
  useEffect(() => {
    if (shown) box.current?.focus();
  }, [shown]);
  if (!shown) return null;
  return (
    <div
      ref={box}
      role="alert"
      tabIndex={-1}
      className="label-plate mx-5 mb-5 scroll-mt-4 px-6 py-5 md:mx-8"
      aria-label="What needs correcting"
    >
      {fault ? (
        <p className="font-[560]">{fault}</p>
      ) : (
        <>
          <p className="font-[600]">
            Nothing is saved yet. {entries.length === 1 ? 'One thing needs' : `${entries.length} things need`}{' '}
            correcting:
          </p>
          <ul className="mt-2 grid gap-1">
            {entries.map(([path, sentence]) => (
              <li key={path}>
                <a
                  href={`#field-${path.split('.')[0]}`}
                  className="underline decoration-rule underline-offset-4"
                  onClick={(event) => {
                    event.preventDefault();
                    focusField(path);
                  }}
                >
                  {sentence}
                </a>
              </li>
            ))}
          </ul>
        </>
      )}
    </div>
  );
}

/** The field itself where it is marked as wrong, else the first of its part. */
function focusField(path: string) {
  const part = document.getElementById(`field-${path.split('.')[0]}`);
  const field = part?.querySelector<HTMLElement>('[aria-invalid="true"]') ?? part?.querySelector<HTMLElement>(FIELDS);
  field?.focus();
  field?.scrollIntoView({ block: 'center' });
}
const FIELDS = 'input, textarea, select, button';

/** Where a summary's link leads. */
export function Field({ name, className, children }: { name: string; className?: string; children: ReactNode }) {
  return (
    <div id={`field-${name}`} className={className}>
      {children}
    </div>
  );
}

/** A part of a form: its name at the left, its fields at the right. */
export function FormPart({ title, about, children }: { title: string; about?: ReactNode; children: ReactNode }) {
  return (
    <section className="grid gap-x-8 gap-y-4 border-t border-grout px-5 py-6 md:px-8 lg:grid-cols-[14rem_minmax(0,1fr)]">
      <div>
        <h2 className="text-lead">{title}</h2>
        {about ? <p className="mt-1 text-ink-soft">{about}</p> : null}
      </div>
      <div className="grid max-w-4xl content-start gap-5 sm:grid-cols-2">{children}</div>
    </section>
  );
}
