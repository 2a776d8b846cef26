import { useEffect, useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import { mailTokenSchema } from '#shared/api/accounts.ts';

export interface LinkToken {
  /** Null when the link had none that could be one. */
  readonly token: string | null;
  /** True once the address had something behind its `#`. */
  readonly given: boolean;
}

/**
 * The token a mailed link carries in its fragment. It leaves the address at once, so that it is in no
 * history, no copied address and no screenshot; it stays in memory until the page is left.
 */
export function useLinkToken(): LinkToken {
  const { hash, pathname } = useLocation();
  const navigate = useNavigate();
  const [kept, setKept] = useState('');
  const inAddress = hash.slice(1);
  if (inAddress !== '' && inAddress !== kept) setKept(inAddress);
  useEffect(() => {
    if (inAddress !== '') void navigate(pathname, { replace: true });
  }, [inAddress, navigate, pathname]);
  const parsed = mailTokenSchema.safeParse(kept);
  return { token: parsed.success ? parsed.data : null, given: kept !== '' };
}
