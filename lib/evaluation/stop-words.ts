/**
 * Words that carry no topic, in English, German, Spanish, French and Portuguese: articles, prepositions, conjunctions, pronouns, auxiliary verbs,
 * and words of titles that say how a work was done rather than what it is about. Lower-case, compared without marks ("für" as "fur").
 */
const lists = {
  english:
    'a about above across after against all along also although am among an and any are as at be because been before being below between both but by can could did do does doing down during each either else few for from further had has have having he her here hers herself him himself his how however i if in into is it its itself just may me might more most must my myself near neither no nor not of off on once one only or other others our ours out over own per same she should since so some such than that the their theirs them themselves then there these they this those through to too toward towards under until up upon us use used using versus very via vs was we were what when where whether which while who whom whose why will with within without would you your yours two three four five new novel',
  englishTitles:
    'study studies analysis approach approaches based case effect effects evidence example evaluation assessment comparison comparative comparing role review overview introduction method methods results result research investigation investigating perspective perspectives toward understanding application applications implication implications insight insights influence impact impacts paper report editorial commentary reply correction erratum part volume i ii iii iv first second',
  german:
    'aber als am an auch auf aus bei beim bis das dass dem den der des die dies diese dieser dieses doch durch ein eine einem einen einer eines er es fur gegen hat haben hier ihr ihre im in ins ist ja kann kein keine konnen mehr mit nach nicht noch nur ob oder ohne sich sie sein seine sind so sowie uber um und unter vom von vor war waren was wenn werden wie wird wir zu zum zur zwischen bzw untersuchung untersuchungen beitrag beitrage bericht studie studien analyse ergebnisse beispiel neue neuer',
  spanish:
    'al algo ante antes como con contra cual cuando de del desde donde durante el ella ellos en entre era es esta estas este esto estos fue ha hacia han hasta la las le les lo los mas mediante mi muy no nos o para pero por que se segun ser si sin sobre son su sus tambien tras un una unas uno unos y ya estudio estudios analisis efecto efectos evaluacion caso nueva nuevo nuevas nuevos',
  french:
    'au aux avec ce ces cet cette chez comme dans de des du elle elles en entre est et etait ete etre eux il ils je la le les leur leurs lors mais meme ne nos notre nous on ou par pas plus pour qu que qui sa sans se selon ses si son sont sous sur ta tes toi ton tres tu un une vers vos votre vous etude etudes analyse effet effets cas nouvelle nouveau nouveaux l d',
  portuguese:
    'a ao aos as ate com como da das de dela dele do dos e ela elas ele eles em entre era essa esse esta este eu foi foram ha isso isto ja la lhe mais mas mesmo muito na nas nao nem no nos o os ou para pela pelas pelo pelos por quando que quem se sem ser seu seus sobre sua suas tambem tem um uma umas uns estudo estudos analise efeito efeitos avaliacao caso nova novo novas novos',
};

export const stopWords: ReadonlySet<string> = new Set(Object.values(lists).flatMap((list) => list.split(' ')));
