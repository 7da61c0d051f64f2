import type { IdentityAnswer } from '@/lib/contracts/identity-answer';

/** Where it comes from, in words and as links. The identifiers were checked when they were kept. */
export function Reference({ identity }: { readonly identity: IdentityAnswer }) {
  const { reference, doi, arxiv } = identity;
  if (reference === undefined && doi === undefined && arxiv === undefined)
    return <p className="text quiet">None is named.</p>;
  return (
    <p className="text">
      {reference}
      {reference !== undefined && (doi !== undefined || arxiv !== undefined) && (/[.!?]$/.test(reference) ? ' ' : '. ')}
      {doi !== undefined && (
        <a href={`https://doi.org/${encodeURI(doi).replace(/[?#]/g, encodeURIComponent)}`} rel="noreferrer">
          doi:{doi}
        </a>
      )}
      {doi !== undefined && arxiv !== undefined && ', '}
      {arxiv !== undefined && (
        <a href={`https://arxiv.org/abs/${arxiv}`} rel="noreferrer">
          arXiv:{arxiv}
        </a>
      )}
    </p>
  );
}
