import { Wordmark } from './_components/brand/wordmark';
import { ButtonLink } from './_components/ui/button';
import { EmptyState } from './_components/ui/states';

export default function NotFound() {
  return (
    <main className="bench-tiles grid min-h-dvh place-items-center p-4">
      <title>Nothing here · Stillroom</title>
      <div className="label-plate w-full max-w-xl">
        <div className="px-5 pt-8 md:px-10">
          <h1>
            <Wordmark />
          </h1>
        </div>
        <EmptyState
          title="There is nothing at this address"
          action={<ButtonLink href="/">To the first page</ButtonLink>}
        >
          The link may be old, or mistyped.
        </EmptyState>
      </div>
    </main>
  );
}
