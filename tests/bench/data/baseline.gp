\\ Equality in K^MW_*(Q), as one would script the decision in PARI/GP: the Milnor part by signs and tame symbols, the Witt part by
\\ signature and second residues. BASELINE_DATA names the data: one case a line, [id, expect, left, right], a side = vector of
\\ [coefficient, word], a word = vector of rationals, 0 standing for eta. Reading the data is not counted.
datafile() = getenv("BASELINE_DATA");
wdeg(w) = sum(i=1, #w, if(w[i]==0, -1, 1));
primesof(W) = {my(S=[]); for(i=1, #W, my(w=W[i][2]); for(j=1, #w, if(w[j]!=0 && abs(w[j])!=1, S=concat(S, factor(abs(w[j]))[,1]~)))); Set(S)};
tame(a, b, p) = {my(i=valuation(a,p), j=valuation(b,p), c=(-1)^(i*j)*a^j/b^i); Mod(numerator(c),p)/Mod(denominator(c),p)};
sqcl(a) = core(numerator(a)*denominator(a));
\\ Witt class: map square class -> multiplicity, [a] = <a>-1
wittof(W) = {my(M=Map(), z); for(i=1, #W, my(w=W[i][2], T=[[1, W[i][1]]]);
   for(j=1, #w, if(w[j]!=0, my(s=sqcl(w[j]), U=List()); for(k=1, #T, listput(U, [T[k][1]*s/gcd(T[k][1],s)^2, T[k][2]]); listput(U, [T[k][1], -T[k][2]])); T=Vec(U)));
   for(k=1, #T, if(!mapisdefined(M, T[k][1], &z), z=0); mapput(M, T[k][1], z+T[k][2]))); Mat(M)};
wittzero(A) = {my(n=matsize(A)[1], S=[]); if(n==0, return(1));
   if(sum(i=1, n, if(A[i,1]>0, A[i,2], -A[i,2])), return(0));
   for(i=1, n, if(abs(A[i,1])!=1, S=concat(S, factor(abs(A[i,1]))[,1]~))); S=Set(S);
   for(k=1, #S, my(p=S[k], a=0, b=0);
     for(i=1, n, if(A[i,1]%p==0, if(p==2, a+=A[i,2], if(kronecker(A[i,1]/p, p)==1, a+=A[i,2], b+=A[i,2]))));
     if(p==2, if(a%2, return(0)), if(p%4==1, if(a%2 || b%2, return(0)), if((a-b)%4, return(0))))); 1};
homzero(W, n) = {my(V=[t | t <- W, vecmin(apply(x->if(x==0,0,1), concat(t[2],[1])))==1], S);
   if(n==0 && sum(i=1, #V, V[i][1]), return(0));
   if(n==1, my(P=1); for(i=1, #V, P*=V[i][2][1]^V[i][1]); if(P!=1, return(0)));
   if(n>=2, if(sum(i=1, #V, if(vecmax(V[i][2])<0, V[i][1], 0))%2, return(0)));
   if(n==2, S=primesof(V); for(k=1, #S, my(p=S[k], P=Mod(1,p)); for(i=1, #V, P*=tame(V[i][2][1], V[i][2][2], p)^V[i][1]); if(P!=1, return(0))));
   wittzero(wittof(W))};
collect(L) = {my(M=Map(), z); for(i=1, #L, if(!mapisdefined(M, L[i][2], &z), z=0); mapput(M, L[i][2], z+L[i][1])); my(A=Mat(M)); [[A[i,2], A[i,1]] | i <- [1..matsize(A)[1]], A[i,2]]};
kmwequal(l, r) = {my(D=collect(concat(l, [[-t[1], t[2]] | t <- r])), N); if(#D==0, return(1)); N=Set([wdeg(t[2]) | t <- D]);
   for(k=1, #N, if(!homzero([t | t <- D, wdeg(t[2])==N[k]], N[k]), return(0))); 1};
{
  my(C=readvec(datafile()), bad=0, T=List(), t0, w0, t, v, w);
  t0=getabstime(); w0=getwalltime();
  for(i=1, #C, t=getabstime(); v=kmwequal(C[i][3], C[i][4]); listput(T, getabstime()-t); if(v!=C[i][2], bad++; print("MISMATCH ", C[i][1], " gp ", v, " expected ", C[i][2])));
  w=getwalltime()-w0; t=getabstime()-t0; T=vecsort(Vec(T));
  print(#C, " cases, ", bad, " mismatches, total ", t, " ms cpu, ", w, " ms wall, median ", T[(#T+1)\2], " ms, 95% ", T[max(1,#T*95\100)], " ms, slowest ", T[#T], " ms");
}
quit
