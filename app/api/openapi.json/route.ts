import * as analysesAnalysisId from '@/app/api/analyses/[analysisId]/route';
import * as analysesAnalysisIdCancel from '@/app/api/analyses/[analysisId]/cancel/route';
import * as analysesAnalysisIdClusters from '@/app/api/analyses/[analysisId]/clusters/route';
import * as analysesAnalysisIdEvidence from '@/app/api/analyses/[analysisId]/evidence/route';
import * as analysesAnalysisIdExport from '@/app/api/analyses/[analysisId]/export/route';
import * as analysesAnalysisIdMap from '@/app/api/analyses/[analysisId]/map/route';
import * as analysesAnalysisIdVerify from '@/app/api/analyses/[analysisId]/verify/route';
import * as analysesAnalysisIdWorks from '@/app/api/analyses/[analysisId]/works/route';
import * as audit from '@/app/api/audit/route';
import * as importsImportId from '@/app/api/imports/[importId]/route';
import * as importsImportIdAccept from '@/app/api/imports/[importId]/accept/route';
import * as importsImportIdCancel from '@/app/api/imports/[importId]/cancel/route';
import * as importsImportIdProblems from '@/app/api/imports/[importId]/problems/route';
import * as importsImportIdColumns from '@/app/api/imports/[importId]/columns/route';
import * as importsImportIdRead from '@/app/api/imports/[importId]/read/route';
import * as importsImportIdRecords from '@/app/api/imports/[importId]/records/route';
import * as importsImportIdSetAside from '@/app/api/imports/[importId]/set-aside/route';
import * as importsImportIdUndo from '@/app/api/imports/[importId]/undo/route';
import * as invitations from '@/app/api/invitations/route';
import * as invitationsId from '@/app/api/invitations/[id]/route';
import * as jobsJobId from '@/app/api/jobs/[jobId]/route';
import * as mails from '@/app/api/mails/route';
import * as matchesMatchId from '@/app/api/matches/[matchId]/route';
import * as me from '@/app/api/me/route';
import * as people from '@/app/api/people/route';
import * as portfolios from '@/app/api/portfolios/route';
import * as portfoliosPortfolioId from '@/app/api/portfolios/[portfolioId]/route';
import * as portfoliosPortfolioIdAnalyses from '@/app/api/portfolios/[portfolioId]/analyses/route';
import * as portfoliosPortfolioIdGrants from '@/app/api/portfolios/[portfolioId]/grants/route';
import * as portfoliosPortfolioIdImports from '@/app/api/portfolios/[portfolioId]/imports/route';
import * as portfoliosPortfolioIdMatches from '@/app/api/portfolios/[portfolioId]/matches/route';
import * as portfoliosPortfolioIdRestore from '@/app/api/portfolios/[portfolioId]/restore/route';
import * as portfoliosPortfolioIdWorks from '@/app/api/portfolios/[portfolioId]/works/route';
import * as search from '@/app/api/search/route';
import * as tokens from '@/app/api/tokens/route';
import * as tokensId from '@/app/api/tokens/[id]/route';
import * as units from '@/app/api/units/route';
import * as unitsId from '@/app/api/units/[id]/route';
import * as users from '@/app/api/users/route';
import * as usersId from '@/app/api/users/[id]/route';
import * as worksWorkId from '@/app/api/works/[workId]/route';
import * as worksWorkIdCiting from '@/app/api/works/[workId]/citing/route';
import * as worksWorkIdReferences from '@/app/api/works/[workId]/references/route';
import { describeApi } from '@/lib/api/openapi';

/** Outside the wrapper: the description of the API holds nothing that a person was given. */
export const publicRoute = 'openapi: the description of the API';

export const dynamic = 'force-dynamic';

const routes = {
  '/api/analyses/{analysisId}': analysesAnalysisId,
  '/api/analyses/{analysisId}/cancel': analysesAnalysisIdCancel,
  '/api/analyses/{analysisId}/clusters': analysesAnalysisIdClusters,
  '/api/analyses/{analysisId}/evidence': analysesAnalysisIdEvidence,
  '/api/analyses/{analysisId}/export': analysesAnalysisIdExport,
  '/api/analyses/{analysisId}/map': analysesAnalysisIdMap,
  '/api/analyses/{analysisId}/verify': analysesAnalysisIdVerify,
  '/api/analyses/{analysisId}/works': analysesAnalysisIdWorks,
  '/api/audit': audit,
  '/api/imports/{importId}': importsImportId,
  '/api/imports/{importId}/accept': importsImportIdAccept,
  '/api/imports/{importId}/cancel': importsImportIdCancel,
  '/api/imports/{importId}/problems': importsImportIdProblems,
  '/api/imports/{importId}/columns': importsImportIdColumns,
  '/api/imports/{importId}/read': importsImportIdRead,
  '/api/imports/{importId}/records': importsImportIdRecords,
  '/api/imports/{importId}/set-aside': importsImportIdSetAside,
  '/api/imports/{importId}/undo': importsImportIdUndo,
  '/api/invitations': invitations,
  '/api/invitations/{id}': invitationsId,
  '/api/jobs/{jobId}': jobsJobId,
  '/api/mails': mails,
  '/api/matches/{matchId}': matchesMatchId,
  '/api/me': me,
  '/api/people': people,
  '/api/portfolios': portfolios,
  '/api/portfolios/{portfolioId}': portfoliosPortfolioId,
  '/api/portfolios/{portfolioId}/analyses': portfoliosPortfolioIdAnalyses,
  '/api/portfolios/{portfolioId}/grants': portfoliosPortfolioIdGrants,
  '/api/portfolios/{portfolioId}/imports': portfoliosPortfolioIdImports,
  '/api/portfolios/{portfolioId}/matches': portfoliosPortfolioIdMatches,
  '/api/portfolios/{portfolioId}/restore': portfoliosPortfolioIdRestore,
  '/api/portfolios/{portfolioId}/works': portfoliosPortfolioIdWorks,
  '/api/search': search,
  '/api/tokens': tokens,
  '/api/tokens/{id}': tokensId,
  '/api/units': units,
  '/api/units/{id}': unitsId,
  '/api/users': users,
  '/api/users/{id}': usersId,
  '/api/works/{workId}': worksWorkId,
  '/api/works/{workId}/citing': worksWorkIdCiting,
  '/api/works/{workId}/references': worksWorkIdReferences,
};

export function GET(): Response {
  return Response.json(describeApi(routes));
}
