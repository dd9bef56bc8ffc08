import type { QualityView } from '@/lib/shared/material-view';

/** How a quality is called: by supplier and code for those who may know them, else by grade and origin. */
export function qualityName({ supplier, code, grade, origin }: QualityView): string {
  const parts = supplier ? [supplier.name, code, grade] : [grade || 'A quality', origin];
  return parts.filter(Boolean).join(', ');
}
