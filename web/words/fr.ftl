### Français.

## The frame

page-title = { $place } – Vitalroll
job = Du registre de suivi aux réponses : ce que sont devenus les patients, quel groupe s’en est mieux sorti, combien seront suivis demain.
skip-to-content = Aller au contenu
places-label = Rubriques
language = Langue
undo = Annuler
licences = Licences des logiciels inclus
engine-version = Vitalroll { $version }
always-cautions = Décrit des groupes ; ne sert pas à décider pour un patient. Les recommandations locales et l’exercice autorisé de la médecine priment. Une association n’est pas une cause.

place-register = Registre
place-outcomes = Devenir
place-compare = Comparer
place-caseload = File active
place-counts = À partir de totaux
place-report = Rapport

needs-javascript = Vitalroll a besoin de JavaScript, désactivé dans ce navigateur.

## The engine's start and the seal

engine-stage-waiting = Préparation…
engine-stage-fetching = Chargement du moteur : { $done } sur { $total }
engine-stage-unpacking = Décompression du moteur…
engine-stage-runtime = Démarrage du moteur…
engine-stage-libraries = Chargement des bibliothèques numériques…
engine-stage-desk = Ouverture du guichet…
not-yet-sealed = Pas encore scellée. Un registre pourra être ouvert une fois la page scellée.
sealed = Scellée : le navigateur refuse désormais ce que cette page demande à tout réseau.
seal-broken = Non scellée : ce navigateur laisse encore la page joindre un réseau. N’ouvrez pas de registre ici ; utilisez un navigateur récent.
sealed-meaning = Tout le nécessaire a été chargé. Le navigateur refuse désormais les demandes de fichiers, d’images, de cadres, de formulaires et de connexions de cette page, qui n’en fait aucune. Aucune règle du navigateur n’empêche une page d’aller à une autre adresse ni toute forme de connexion directe ; le programme de cette page ne fait ni l’un ni l’autre. Pour une certitude entière, coupez le réseau avant d’ouvrir un registre. Recharger la page recommence de zéro, rien n’est conservé.
sealed-tried = Pour s’en assurer, la page a tenté { $tried } requêtes inoffensives vers sa propre adresse après le scellement ; le navigateur en a refusé { $refused }.
sealed-check-yourself = Pour le vérifier vous-même : coupez le réseau maintenant ; tout continue de fonctionner. Ou ouvrez les outils de développement du navigateur, liste des requêtes, et constatez que rien ne s’ajoute.
engine-revived-out_of_memory = Le moteur a manqué de mémoire et a été relancé. Votre fichier et vos choix sont de retour ; la dernière question est restée sans réponse.
engine-revived-internal = Le moteur s’est arrêté de façon inattendue et a été relancé. Votre fichier et vos choix sont de retour.
engine-revived-register_lost = Le moteur a été relancé, mais votre registre n’a pas pu être rouvert. Ouvrez de nouveau le fichier.
engine-revived-gone = Le moteur s’est arrêté et n’a pas pu être relancé. Rechargez la page et ouvrez de nouveau le fichier.
engine-revived-stopped = Arrêté. Votre fichier et vos choix sont de retour.
start-again = Recommencer
engine-failure-network = Le moteur n’a pas pu être chargé. Vérifiez la connexion vers l’endroit d’où vient cette page, puis recommencez.
engine-failure-integrity = Une partie du moteur est arrivée abîmée ou modifiée et n’a pas été utilisée. Recommencez ; si cela se répète, prévenez la personne qui héberge cette page.
engine-failure-too_old = Ce navigateur est trop ancien pour le moteur. Utilisez une version récente de Firefox, Chrome, Edge ou Safari.
engine-failure-internal = Le moteur n’a pas pu démarrer. Recommencez ; si cela se répète, essayez un autre navigateur récent.
megabytes = { $size } Mo

## Words that every place uses

estimate = { $value } ({ $lower } à { $upper })
everyone = Ensemble
working = Calcul en cours…
answer-working = Calcul en cours…
stop = Arrêter
save-table = Enregistrer ce tableau en CSV
save-figure = Enregistrer cette figure en SVG
figure-data = Les nombres derrière cette figure
cautions-label = Précautions
no-register-yet = Ouvrez d’abord un registre, dans la rubrique Registre ; ou passez par « À partir de totaux » si vous n’avez que des totaux.
choose = Choisir…
none = Aucun
years-count = { $years ->
    [one] { $years } an
   *[other] { $years } ans
}

meaning-under_care = encore suivi
meaning-died_of_disease = décédé de la maladie
meaning-died_of_other_cause = décédé d’une autre cause
meaning-died_cause_unknown = décédé, cause inconnue
meaning-recovered = guéri ou traitement terminé
meaning-moved_away = parti ailleurs (transféré)
meaning-lost = perdu de vue
meaning-stopped = arrêt volontaire

covariate-sex = Sexe
covariate-age = Âge au début
covariate-age_band = Tranche d’âge au début
covariate-start_year = Année de début
covariate-start_period = Période de début
sex-female = Femme
sex-male = Homme
sex-other = Autre

question-interest = Quelles issues sont l’événement étudié ?
question-interest-hint = Toute autre issue met seulement fin à l’observation.
question-group = Par groupe
question-no-group = Sans groupes : tout le monde ensemble

## Refusals that any place can meet

refusal-internal = Le calcul n’a pas abouti à cause d’une erreur du programme. Rien de ce que vous avez saisi n’est perdu.
refusal-worker_died = Le moteur s’est arrêté deux fois sur cette question. Demandez moins à la fois, par exemple moins de groupes ou un fichier plus petit.
refusal-out_of_memory = La mémoire n’a pas suffi. Fermez d’autres onglets ou ouvrez un fichier plus petit.
refusal-stopped = Arrêté avant la fin.
refusal-no_register = Ouvrez d’abord un registre.
refusal-unknown_field = La demande comporte un élément inconnu : { $field }.
refusal-missing_field = Il manque encore : { $field }.
refusal-wrong_type = { $field } n’est pas du bon type.
refusal-not_one_of = { $field } ne fait pas partie des choix possibles.
refusal-out_of_range = { $field } doit être compris entre { $least } et { $greatest }.
refusal-unknown_task = Le moteur ne sait pas faire cela.
refusal-unknown_meaning = { $meaning } ne fait pas partie des issues connues.
refusal-unknown_covariate = La colonne { $covariate } ne fait pas partie du registre tel qu’il a été lu.
refusal-group_is_numeric = { $covariate } est un nombre. Choisissez une colonne à quelques catégories pour former des groupes.
refusal-no_outcome_of_interest = Choisissez au moins une issue comme événement étudié.
refusal-under_care_is_not_an_outcome = Être encore suivi n’est pas une issue : choisissez une fin de suivi.
refusal-uneven_cohort = Les colonnes du registre n’ont pas la même longueur.
refusal-negative_time = Ligne { $line } : temps antérieur au début du suivi.
refusal-exit_before_entry = Ligne { $line } : le suivi se termine avant d’avoir commencé.

## Register

register-title = Registre

register-lead = Ouvrez la liste des patients : une ligne par patient, depuis un tableur ou un fichier texte. Elle est lue sur cet ordinateur et nulle part ailleurs.
open-file = Choisissez un fichier ou déposez-le ici
open-file-hint = .csv, .tsv, .txt, .xlsx ou .ods
open-demo = Ouvrir le registre inventé de démonstration
demo-meaning = Environ 1 160 patients inventés d’une consultation inventée de cardiopathie rhumatismale, avec les défauts des vrais registres.
open-not-yet = Un registre peut être ouvert dès que le moteur est prêt et la page scellée ; voyez la ligne en haut.
paste-summary = Ou collez des cellules d’un tableur
paste-label = Cellules avec leurs en-têtes
paste-open = Ouvrir ce qui a été collé
pasted-name = cellules collées
opening-file = Lecture…
opening-share = Lecture : { $share }
replace-question = Un registre est ouvert. En ouvrir un autre l’abandonne, avec tous les choix faits à son sujet.
replace-yes = Ouvrir l’autre
replace-no = Garder celui-ci

register-example-title = Ce qu’il faut dans la liste
register-example-lead = Au minimum : le début du suivi, le dernier contact ou le départ, et comment cela s’est terminé. Un numéro de patient sert à trouver les doublons, puis il est abandonné. D’autres colonnes peuvent former des groupes ; celles qui ne servent pas sont abandonnées.
register-example-caption = Un exemple inventé
register-example-number = Numéro
register-example-start = Début du suivi
register-example-end = Dernier contact ou fin
register-example-outcome = Issue
register-example-sex = Sexe
register-example-group = Stade
register-example-number-1 = 101
register-example-start-1 = 14/03/2019
register-example-end-1 = 02/06/2025
register-example-outcome-1 = Suivi
register-example-sex-1 = F
register-example-group-1 = Léger
register-example-number-2 = 102
register-example-start-2 = 20/05/2019
register-example-end-2 = 11/01/2022
register-example-outcome-2 = Décédé
register-example-sex-2 = M
register-example-group-2 = Sévère
register-example-number-3 = 103
register-example-start-3 = 03/09/2020
register-example-end-3 = 17/02/2023
register-example-outcome-3 = Perdu de vue
register-example-sex-3 = F
register-example-group-3 = Modéré

source-title = Le fichier
source-delimited = { $rows } lignes, { $columns } colonnes, séparées par : { $delimiter } ; caractères lus en { $encoding }.
source-workbook = un classeur : { $rows } lignes, { $columns } colonnes.
source-sheet = Feuille
source-header = Ligne des en-têtes
source-header-hint = À changer si les en-têtes sont ailleurs.
delimiter-comma = virgule
delimiter-semicolon = point-virgule
delimiter-tab = tabulation
delimiter-bar = barre verticale
preview-caption = Les premières lignes telles qu’elles ont été lues
line = Ligne
rows = Lignes

columns-title = À quoi sert chaque colonne
columns-lead = Les choix ci-dessous sont des propositions. Corrigez ce qui est faux ; tout le reste en découle.
columns-caption = Les colonnes et leur usage
columns-dropped = Les colonnes « non utilisées » sont abandonnées avant tout calcul, de même que les numéros et les noms des patients, une fois comparés.
column-heading = Colonne
column-looks = Ce qu’elle contient
column-role = Usage
column-unnamed = Colonne { $position }, sans en-tête
role-of = Usage de { $column }
role-none = non utilisée
role-patient_number = numéro de patient
role-start = début du suivi (diagnostic)
role-observed_from = première visite ici, si plus tardive
role-end = dernier contact ou fin
role-outcome = issue
role-sex = sexe
role-birth_date = date de naissance
role-age = âge au début
role-group = pour former des groupes
order-settled = Dates : { $order }.
order-ask = Comment les dates sont-elles écrites ?
order-day_month_year = jour, mois, année
order-month_day_year = mois, jour, année
order-year_month_day = année, mois, jour
order-serial_1900 = numéros de jour du tableur
order-serial_1904 = numéros de jour du tableur, comptés depuis 1904

meanings-title = L’issue : ce que signifie chaque valeur
meanings-lead = Les lignes dont la valeur n’a pas de sens sont écartées et comptées.
meanings-caption = Valeurs de la colonne de l’issue
meaning-none = aucun sens : écartée
meaning-of = Sens de { $value }
blank-value = (rien d’écrit)
value = Valeur
means = Signifie
sexes-title = Le sexe : ce que signifie chaque valeur
sexes-lead = Les valeurs sans signification comptent comme non renseignées.
sexes-caption = Valeurs de la colonne du sexe
sex-none = non renseigné

closing-title = La date de clôture
closing-label = Jour où le registre a été arrêté
closing-hint = Personne n’est suivi au-delà. Elle est demandée car le fichier ne la montre pas, et l’horloge de l’ordinateur n’est jamais utilisée.

understood-title = Ce qui a été compris
still-missing = Reste à choisir :
missing-start = la colonne du début du suivi
missing-end = la colonne du dernier contact ou de la fin
missing-outcome = la colonne de l’issue
missing-closing = la date de clôture
missing-order = la façon d’écrire les dates
missing-meanings = ce que signifient les valeurs de l’issue
understood-sentence = { $n } patients tirés de { $rows } lignes, dont le suivi a commencé entre le { $first } et le { $last } et va au plus tard jusqu’au { $closing } : { $years } personnes-années.
outcomes-caption = Comment le suivi s’est terminé
how-it-ended = Issue
reason = Raison
every-line = Toutes les lignes
set-aside-nothing = Aucune ligne n’a été écartée.
set-aside-title = { $n ->
    [one] Une ligne a été écartée
   *[other] { $n } lignes ont été écartées
  }
set-aside-caption = Lignes écartées, par raison
set-aside-lines-caption = Lignes écartées, avec leur numéro dans le fichier
changed-nothing = Aucune ligne n’a été modifiée.
changed-title = { $n ->
    [one] Une ligne a été lue avec une modification
   *[other] { $n } lignes ont été lues avec une modification
  }
changed-caption = Modifications, par raison
changed-lines-caption = Lignes modifiées, avec leur numéro dans le fichier
dropped-columns = Abandonnées avant l’analyse : { $columns }.
next = Ensuite :
findings-title = Ce qui peut être faux
findings-empty = Les constats s’affichent dès que le registre est compris.
findings-none = Aucun contrôle n’a rien trouvé.
findings-sentence = Les contrôles ont trouvé { $n ->
    [one] un point
   *[other] { $n } points
  } à examiner ; une correction est proposée pour { $repairs }.
findings-sentence-untouched = Rien n’a été corrigé : tous les résultats utilisent le registre tel qu’il a été lu.
findings-sentence-accepted = Avec { $accepted ->
    [one] une correction acceptée
   *[other] { $accepted } corrections acceptées
  } ({ $cells ->
    [one] un changement
   *[other] { $cells } changements
  }), il y a { $n } patients au lieu de { $before }, { $deaths } décès au lieu de { $deathsBefore }, et la survie à { $years } ans est de { $survival } au lieu de { $survivalBefore }.
findings-caption = Ce que les contrôles ont trouvé, et les corrections possibles
findings-method = Chaque contrôle examine le registre tel qu’il est écrit ; une correction n’est faite que si elle est acceptée, dans l’ordre de ce tableau, et ce que l’une a changé, aucune autre ne le change plus. L’effet se calcule en construisant la cohorte deux fois, avec et sans la correction, toutes les autres corrections acceptées étant gardées : patients, décès de toute cause, perdus de vue et survie à { $years } ans par la méthode produit-limite (Kaplan & Meier 1958). Les noms sont comparés par le nombre de fautes qui les séparent (Damerau 1964), entre voisins dans l’ordre alphabétique de même date de naissance ou de même début (Hernández & Stolfo 1995), puis abandonnés.
finding = Constat
finding-lines = { $n ->
    [one] Ligne { $lines }
   *[other] Lignes { $lines }
  }
repair = Correction proposée
decision = Décision
change = Changement
severity-grave = (grave)
severity-doubtful = (douteux)
severity-slight = (léger)
repair-accept = faire cette correction
repair-accept-of = Accepter la correction : { $finding }
repair-accept-row = Corriger la ligne { $line }
repair-accepted = acceptée
repair-not-accepted = non acceptée
repair-none = aucune : à vérifier dans les dossiers
effect-n = Patients { $before } → { $after }.
effect-events = Décès { $before } → { $after }.
effect-lost = Perdus de vue { $before } → { $after }.
effect-survival = Survie à { $years } ans { $before } → { $after }.
effect-nothing = Elle ne change ni le nombre de patients, de décès ou de perdus de vue, ni la survie à cinq ans.
effect-overruled = { $n ->
    [one] Une ligne avait
   *[other] { $n } lignes avaient
  } déjà été changées par une correction plus haut.
effects-summary = Les chiffres avec et sans chaque correction
effects-caption = Le résultat principal avec et sans chaque correction
effects-n-without = Patients sans elle
effects-n-with = Patients avec elle
effects-events-without = Décès sans elle
effects-events-with = Décès avec elle
effects-lost-without = Perdus de vue sans elle
effects-lost-with = Perdus de vue avec elle
effects-survival-without = Survie à { $years } ans sans elle
effects-survival-with = Survie à { $years } ans avec elle
row-by-row = Ligne par ligne : { $finding } ({ $n })
row-by-row-hint = Acceptez d’abord la correction ci-dessus ; chaque ligne pourra ensuite être laissée telle quelle.
row-by-row-caption = { $finding } : chaque ligne
row-by-row-first = Les { $listed } premières lignes sur { $n } sont données ; la décision ci-dessus vaut pour toutes.
corrections-caption = Corrections faites, à rapporter aux archives
corrections-none = Aucune correction n’a été faite.
correction-what = Quoi
correction-before = Écrit
correction-after = Lu comme
change-of-start = début
change-of-end = fin du suivi
change-of-outcome = issue
change-of-birth = date de naissance
change-of-same_as = patient
change-of-number = numéro de patient
change-to = { $what } : { $before } → { $after }
change-same_as = la ligne { $line } est le patient de la ligne { $after }
change-number = compte comme un patient à part
change-on-line = ligne { $line } : { $change }
on-line = ligne { $line }
nothing-written = (non renseigné)
caution-corrections_shortened = { $listed } corrections sur { $n } sont données ; toutes sont faites.

finding-slipped_sideways-short = Cellules décalées
finding-slipped_sideways = Les cellules se trouvent une colonne à côté de la leur.
repair-read_beside = lire la ligne là où ses cellules se trouvent
finding-day_and_month_changed_over-short = Jour et mois intervertis
finding-day_and_month_changed_over = Les dates se contredisent telles quelles, et s’accordent si le jour et le mois de l’une sont intervertis.
repair-change_over = intervertir le jour et le mois
finding-ends_before_start-short = Fin avant le début
finding-ends_before_start = La fin précède le début ; la ligne est mise de côté.
repair-year_later = si la fin tombe en début d’année, prendre l’année suivante : on a peut-être continué d’écrire l’ancienne
finding-far_after_closing-short = Loin après la date de clôture
finding-far_after_closing = Une date tombe plus d’un an après la date de clôture : année mal écrite, ou autre calendrier.
finding-born_in_wrong_century-short = Siècle de naissance faux
finding-born_in_wrong_century = Une année de naissance à deux chiffres a été lue comme postérieure au début.
repair-century_back = reculer la date de naissance de cent ans
finding-no_such_day-short = Jour inexistant
finding-no_such_day = Ce jour n’existe pas dans le calendrier ; la ligne est mise de côté.
repair-last_of_month = prendre le dernier jour de ce mois
finding-death_date_but_alive-short = Une date de décès, mais pas « décédé »
finding-death_date_but_alive = Une date de décès est écrite, et l’issue dit autre chose.
repair-count_as_died = compter comme décédé, cause inconnue, à cette date
finding-contact_after_death-short = Contact après le décès
finding-contact_after_death = Le dernier contact est postérieur à la date de décès ; le suivi va jusqu’à la plus tardive des deux.
repair-end_at_death = terminer le suivi à la date de décès
finding-died_without_date-short = Décès sans date
finding-died_without_date = Un décès est noté sans aucune date ; la ligne est mise de côté et le décès n’est pas compté : la survie paraît meilleure qu’elle n’est.
finding-death_dated_by_contact-short = Décès daté du dernier contact
finding-death_dated_by_contact = La date de décès est vide, et le décès compte au jour du dernier contact, qui l’a précédé.
repair-midway = placer le décès à mi-chemin entre le dernier contact et la date de clôture
finding-transfer_as_lost-short = Transferts parmi les perdus de vue
finding-transfer_as_lost = Ce qui est écrit parle d’un transfert, et a été pris pour une perte de vue.
repair-count_as_moved = compter comme transféré
finding-unseen_for_long-short = En suivi, mais pas vu depuis longtemps
finding-unseen_for_long = Compté comme en suivi, et pas vu pendant plus de { $months } mois avant la date de clôture.
repair-count_as_lost = compter comme perdu de vue au jour du dernier contact
finding-closing_date_as_contact-short = Date de clôture recopiée comme dernier contact
finding-closing_date_as_contact = { $share } de ceux qui ne sont pas décédés ont été vus pour la dernière fois le jour même de la clôture. Une liste a peut-être été remplie au bureau, et des pertes sont cachées.
finding-same_number-short = Un patient sur plusieurs lignes
finding-same_number = { $patients ->
    [one] Un numéro de patient figure
   *[other] { $patients } numéros de patient figurent
  } sur plusieurs lignes ; la première utilisable compte, les autres sont mises de côté.
repair-make_one = en faire une ligne : le début le plus précoce, et la fin la plus tardive avec son issue ; un décès prime sur tout
finding-one_number_two_people-short = Un numéro, deux personnes
finding-one_number_two_people = { $numbers ->
    [one] Un numéro de patient figure
   *[other] { $numbers } numéros de patient figurent
  } sur des lignes de sexe ou de date de naissance différents ; seule la première compte.
repair-count_each = compter chaque ligne comme un patient à part
finding-likely_same_person-short = Probablement une seule personne
finding-likely_same_person = { $patients ->
    [one] Une personne semble
   *[other] { $patients } personnes semblent
  } figurer sous des numéros différents : nom, date de naissance, sexe ou début s’accordent pour autant qu’on les connaisse.
finding-more_cells_than_columns-short = Plus de cellules que de colonnes
finding-more_cells_than_columns = Un séparateur se trouve dans une cellule, et nul ne sait quelle cellule est laquelle ; les lignes sont mises de côté.
finding-age_against_birth-short = Âge contre date de naissance
finding-age_against_birth = L’âge écrit et la date de naissance diffèrent de plus d’un an ; l’âge est calculé d’après la date de naissance.
repair-written_age = faire compter l’âge écrit
finding-months_without_start-short = Mois sans nouveaux patients
finding-months_without_start = Pendant { $n ->
    [one] un mois
   *[other] { $n } mois
  }, personne ne commence ({ $months }). Des pages sont-elles perdues, ou la consultation était-elle fermée ?
finding-sex_not_recorded-short = Sexe non renseigné
finding-sex_not_recorded = Le sexe est vide, ou une valeur à laquelle aucun sens n’a été donné.
finding-died_on_first_day-short = Décédé le premier jour
finding-died_on_first_day = Le décès tombe le jour du début : la maladie n’a peut-être été trouvée qu’au décès.
finding-heaped_starts-short = Débuts entassés sur deux jours
finding-heaped_starts = { $share } des débuts tombent le 1er ou le 15 d’un mois, alors qu’on attendrait 7 % : le jour était souvent inconnu.
finding-heaped_ends-short = Fins entassées sur deux jours
finding-heaped_ends = { $share } des fins tombent le 1er ou le 15 d’un mois, alors qu’on attendrait 7 % : le jour était souvent inconnu.
finding-two_digit_years-short = Années à deux chiffres
finding-two_digit_years = Chacune a été prise entre { $first } et { $last }.
finding-totals_among_rows-short = Totaux parmi les patients
finding-totals_among_rows = Les lignes de totaux ne sont pas des patients et sont mises de côté.
finding-headings_repeated-short = En-têtes répétés
finding-headings_repeated = Les en-têtes figurent à nouveau parmi les patients et sont mis de côté.

set-aside-same_patient = Le même patient figure à la ligne { $first_line } ; les lignes n’en font plus qu’une.
set-aside-same_patient-short = Réunie avec une autre ligne
role-name = nom : seulement pour trouver les doublons
role-death_date = date de décès

silent-title = Pertes de vue que personne n’a notées
silent-months = Perdu de vue si non vu pendant plus de ce nombre de mois avant la date de clôture
silent-months-hint = Plus long que le plus long délai habituel entre deux visites dans votre consultation.
silent-count = les compter comme perdus de vue
silent-sentence = { $changed } des { $care } patients en suivi n’ont pas été vus pendant plus de { $months } mois avant la date de clôture. Les compter comme perdus de vue en porterait le nombre de { $before } ({ $was }) à { $after } ({ $share }).
silent-sentence-counted = { $changed } des { $care } patients en suivi n’ont pas été vus pendant plus de { $months } mois avant la date de clôture et comptent comme perdus de vue : { $after } ({ $share }) au lieu de { $before } ({ $was }).
silent-caption = Combien comptent comme perdus de vue, selon les mois que la règle admet
silent-unseen = Mois sans être vu
silent-changed = En suivi, puis perdus de vue
silent-lost = Perdus de vue en tout
silent-method = Le suivi de ceux que la règle compte comme perdus de vue s’arrête au jour du dernier contact, comme avant ; seul son sens change. La survie reste donc la même, mais les bornes dues aux pertes s’élargissent, et la rétention baisse. Un mois compte 365,25 / 12 jours.
caution-under_care_without_contact = { $n } des { $of } patients en suivi n’ont aucun dernier contact : ils sont suivis jusqu’à la clôture sur parole, et cette règle ne peut les juger.

spellings-title = Orthographe des groupes
spellings-none = Aucune valeur des colonnes de groupe ne ressemble à une autre mal écrite.
spellings-caption = { $heading } : valeurs qui n’en font probablement qu’une
spellings-method = Les valeurs sont comparées mot à mot à celles qui figurent sur plus de lignes : une faute dans les mots de 5 lettres ou plus, deux dans ceux de 10 ou plus (Damerau 1964) ; les nombres, les mots courts et les premières lettres doivent être les mêmes. Rien n’est réuni sans demande.
spelling-into = Probablement
spelling-merge = les réunir
spelling-merge-of = Prendre { $value } pour { $into }
value-like = écrit comme « { $value } »
refusal-merged_in_a_circle = « { $value } » est pris pour une valeur qui est prise pour elle.

settings-title = Les mêmes choix pour la prochaine liste
settings-lead = Ce qui est choisi sur cette page (colonnes, significations, règles, date de clôture, genres de corrections) peut être gardé dans un petit fichier. Il contient des en-têtes et des valeurs courantes, et rien d’un patient.
settings-apply = Appliquer des choix gardés :
settings-save = Enregistrer ces choix
settings-save-later = Possible dès que tout est choisi.
settings-left-out = { $n ->
    [one] Une valeur n’est
   *[other] { $n } valeurs ne sont
  } pas dans le fichier, parce que moins de trois lignes la portent : elle pourrait désigner un patient.
settings-applied = Les choix gardés ont été appliqués à { $matched } colonnes de cette liste.
settings-absent = Colonnes absentes de cette liste :
settings-added = Colonnes nouvelles dans cette liste, inutilisées tant qu’on ne les choisit pas :
settings-new-values = Issues que les choix gardés ne connaissent pas :
settings-rows = { $n ->
    [one] une ligne
   *[other] { $n } lignes
  }
settings-no-difference = Colonnes et issues sont les mêmes qu’alors.
caution-order_differs = Les dates de « { $heading } » ne sont plus écrites dans l’ordre { $order } ; elles ont été lues comme elles se montrent.
caution-not_dates_any_more = « { $heading } » ne contient pas de dates dans cette liste ; la colonne n’est pas utilisée.
caution-closing_date_from_settings = La date de clôture, le { $closing }, est celle de l’ancienne liste. Mettez le jour où cette liste a été arrêtée.
caution-dates_after_closing = { $n } dates tombent après le { $closing } et ne compteraient pas.
refusal-settings_not_read = Ce n’est pas un fichier de choix gardé par cette page.
refusal-settings_too_new = Ces choix ont été gardés par une version plus récente de cette page (forme { $version } ; cette page connaît { $known }).

profile-title = La qualité du registre
profile-site = Complétude aussi selon
profile-no-site = sans groupes
completeness-sentence = { $index } du temps observable a été observé ; { $known } si guérison, transfert et arrêt volontaire comptent comme complets.
completeness-by-year = Complétude du suivi, par année de début
completeness-by-site = Complétude du suivi, par groupe
completeness-year = Année de début
completeness-observed = Personnes-années observées
completeness-possible = Personnes-années possibles
completeness-index = Indice de temps-personne
completeness-known = Issues connues complètes
profile-newcomers = Nouveaux patients par mois
profile-newcomers-described = Des barres pour { $months } mois, une par mois, aussi hautes que le nombre de patients qui y ont commencé.
profile-month = Mois
profile-missing = Ce qui manque, par colonne et selon la fin du suivi
profile-missing-note = Cellules vides et mots comme « inconnu » ou « n/a ». Là où la part diffère selon l’issue, ne comparer que les lignes complètes peut tromper. La dernière colonne : guéris, transférés ou arrêtés.
profile-missing-cells = Manquent
profile-ending-under_care = En suivi
profile-ending-died = Décédés
profile-ending-lost = Perdus de vue
profile-ending-known = Issue connue
profile-days-start = Parmi les débuts, { $share } tombent le { $day } d’un mois, alors qu’on attendrait { $expected }.
profile-days-start-title = Débuts selon le jour du mois
profile-days-end = Parmi les fins avant la clôture, { $share } tombent le { $day } d’un mois, alors qu’on attendrait { $expected }.
profile-days-end-title = Fins selon le jour du mois
profile-days-described = Des barres pour les 31 jours du mois, avec un trait à la hauteur attendue par hasard ; le { $day } ressort le plus.
profile-day = Jour
profile-expected = Attendu
profile-ages = L’indice de Whipple des âges écrits est de { $index }, d’après { $n } âges de 23 à 62 ans : 100 signifie aucune préférence pour les âges terminés par 0 et 5, et 500 qu’il n’y en a pas d’autres.
profile-ages-from-birth = L’indice de Whipple des âges calculés d’après les dates de naissance est de { $index }, d’après { $n } âges de 23 à 62 ans : 100 signifie aucune préférence pour les âges terminés par 0 et 5. Des années de naissance arrondies ne s’y voient qu’en partie.
profile-ages-title = Âges de 23 à 62 ans selon leur dernier chiffre
profile-ages-described = Dix barres, une par dernier chiffre, avec un trait à la hauteur attendue sans préférence.
profile-digit = Dernier chiffre
profile-method = Indice de temps-personne : temps observé sur temps observable jusqu’à la clôture ou au décès (Clark, Altman & De Stavola 2002). Indice de Whipple : 500 fois la part des âges terminés par 0 ou 5 parmi ceux de 23 à 62 ans, avec des bornes selon Wilson (1927) ; selon la lecture usuelle (Nations Unies 1955), moins de 105 est très exact, 175 ou plus très grossier. Les jours attendus sont ceux du calendrier sur 400 ans.
caution-few_ages = Seulement { $n } âges de 23 à 62 ans : en dessous de { $least }, l’indice n’est guère plus que du hasard.
caution-many_sites = { $sites } groupes sont trop pour ce tableau (au plus { $most }).
refusal-nobody_to_profile = Toutes les lignes ont été mises de côté ; il n’y a rien à décrire.

trace-title = Qui rechercher
trace-months = Mois depuis le dernier contact, plus de
trace-with-lost = aussi ceux notés perdus de vue
trace-columns = Colonnes à mettre sur la liste
trace-columns-legend = Colonnes de la liste
trace-columns-hint = Rien d’autre que celles-ci, la ligne du fichier et le dernier contact n’est montré ni enregistré.
trace-sentence = { $n ->
    [one] Un patient n’a pas été vu
   *[other] { $n } patients n’ont pas été vus
  } pendant plus de { $months } mois avant la date de clôture.
trace-unjudged = { $n ->
    [one] Un autre est
   *[other] { $n } autres sont
  } en suivi sans aucun dernier contact ; nul ne peut dire depuis quand.
trace-method = Jours du dernier contact à la date de clôture, les plus longs d’abord. Décès, guérisons, transferts et arrêts volontaires n’y figurent pas. La liste elle-même reste hors du rapport.
trace-days = Jours sans être vu
trace-last = Dernier contact
trace-caption = Les plus longtemps non vus d’abord
trace-first = Les { $shown } premiers sur { $n } sont montrés ; le fichier les contient tous.
trace-save = Enregistrer la liste de { $n } en CSV sur cet ordinateur
caution-trace_list_identifies = Cette liste désigne des personnes. Gardez-la là où le registre est gardé, ne la remettez qu’à ceux qui recherchent, et détruisez-la ensuite.
caution-trace_list_shortened = { $listed } sur { $n } sont donnés.

calendar-title = Un autre calendrier ?
calendar-of = Calendrier de { $column }
calendar-gregorian = grégorien, ou années bouddhiques
calendar-ethiopian = éthiopien (jour, mois, année)
calendar-persian = persan
calendar-hijri = hégirien
calendar-bikram_sambat = Bikram Sambat
refusal-calendar_not_converted = Les dates de « { $heading } » suivent un autre calendrier ({ $calendar }). Il ne se convertit pas par soustraction, et cette page n’a pas de tables pour lui. Faites convertir les dates dans le programme d’où elles viennent, et enregistrez de nouveau la liste.
finding-partial_date-short = Jour ou mois inconnu
finding-partial_date = Seul le mois ou l’année d’une date est écrit ; la ligne est mise de côté, ou son âge n’est pas connu.
repair-middle_of_period = prendre le 15 de ce mois, ou le 1er juillet de cette année, entre le début et la clôture
repair-first_of_period-effect = Avec le premier jour, la survie à { $years } ans serait de { $survival } ({ $deaths } décès) ;
repair-last_of_period-effect = avec le dernier jour, de { $survival } ({ $deaths } décès, à { $years } ans).

register-other-title = Un autre registre
forget = Tout oublier
forget-meaning = Retire de la mémoire le registre et tous les choix faits à son sujet.

evidence-heading_says = Son en-tête dit « { $words } ».
evidence-reads_as_dates = { $read } sur { $filled } ressemblent à des dates.
evidence-order_settled = { $n ->
    [one] Une date montre
   *[other] { $n } dates montrent
  } l’ordre : { $order }.
evidence-order_not_settled = Rien ne montre si le jour ou le mois vient en premier.
evidence-reads_as_numbers = Des nombres dans les { $filled } lignes remplies.
evidence-values_recognised = { $recognised } sur { $filled } disent quelque chose de reconnu.
evidence-all_different = { $distinct } valeurs différentes.
evidence-few_values = { $distinct } valeurs différentes.
evidence-many_values = { $distinct } valeurs différentes : trop pour former des groupes.
evidence-heading_identifies = Son en-tête (« { $words } ») dit qu’elle identifie des personnes.
evidence-heading_of_notes = Son en-tête (« { $words } ») dit qu’elle contient des notes.
evidence-earliest_dates = Ses dates viennent en premier.
evidence-latest_dates = Ses dates viennent en dernier.
evidence-free_text = Texte libre.
evidence-nothing_in_it = Elle est vide.

set-aside-repeated_heading = Les en-têtes sont répétés ici.
set-aside-repeated_heading-short = En-têtes répétés
set-aside-subtotal_row = Un total, pas un patient.
set-aside-subtotal_row-short = Totaux
set-aside-too_many_cells = Plus de cellules que de colonnes ({ $cells } au lieu de { $columns }) : un séparateur se trouve peut-être dans une cellule.
set-aside-too_many_cells-short = Trop de cellules
set-aside-no_start_date = Le début du suivi est vide.
set-aside-no_start_date-short = Sans date de début
set-aside-unreadable_start_date = « { $written } » n’est pas une date de début.
set-aside-unreadable_start_date-short = Le début n’est pas une date
set-aside-partial_start_date = Il manque au début, « { $written } », le jour ou le mois.
set-aside-partial_start_date-short = Début sans jour ou sans mois
set-aside-impossible_start_date = Le jour « { $written } » n’existe pas.
set-aside-impossible_start_date-short = Le jour du début n’existe pas
set-aside-start_after_closing = Commence le { $start }, après la date de clôture.
set-aside-start_after_closing-short = Commence après la clôture
set-aside-no_outcome = L’issue est vide.
set-aside-no_outcome-short = Issue vide
set-aside-outcome_without_meaning = « { $value } » n’a reçu aucun sens.
set-aside-outcome_without_meaning-short = Issue sans signification
set-aside-unreadable_end_date = « { $written } » n’est pas une date de fin.
set-aside-unreadable_end_date-short = La fin n’est pas une date
set-aside-partial_end_date = Il manque à la fin, « { $written } », le jour ou le mois.
set-aside-partial_end_date-short = Fin sans jour ou sans mois
set-aside-impossible_end_date = Le jour « { $written } » n’existe pas.
set-aside-impossible_end_date-short = Le jour de la fin n’existe pas
set-aside-no_end_date = Le suivi s’est terminé, mais on ne sait pas quand.
set-aside-no_end_date-short = Terminé sans date
set-aside-end_before_start = Se termine le { $end }, avant d’avoir commencé le { $start }.
set-aside-end_before_start-short = Se termine avant de commencer
set-aside-birth_after_start = Né le { $birth }, après le début le { $start }.
set-aside-birth_after_start-short = Né après le début
set-aside-unreadable_observed_from = « { $written } » n’est pas une date de première visite ici.
set-aside-unreadable_observed_from-short = La première visite ici n’est pas une date
set-aside-partial_observed_from = Il manque à la première visite ici, « { $written } », le jour ou le mois.
set-aside-partial_observed_from-short = Première visite ici sans jour ou sans mois
set-aside-impossible_observed_from = Le jour « { $written } » n’existe pas.
set-aside-impossible_observed_from-short = Le jour de la première visite ici n’existe pas
set-aside-before_observed_from = Se termine le { $end }, avant la première visite ici le { $observed_from }.
set-aside-before_observed_from-short = Se termine avant la première visite ici
set-aside-no_time_at_risk = Vu ici pour la première et la dernière fois le même jour, { $observed_from } : aucun temps observé.
set-aside-no_time_at_risk-short = Aucun temps observé
set-aside-duplicate_number = Le numéro de patient figure déjà à la ligne { $first_line }.
set-aside-duplicate_number-short = Numéro de patient répété

changed-under_care_to_closing = Encore suivi sans dernier contact : suivi jusqu’à la date de clôture.
changed-under_care_to_closing-short = Encore suivi, jusqu’à la clôture
changed-observed_before_start = Première visite ici le { $observed_from }, avant le début : observé depuis le début.
changed-observed_before_start-short = Première visite avant le début
changed-followed_past_closing = Se termine le { $end }, après la clôture : encore suivi à cette date.
changed-followed_past_closing-short = Terminé après la clôture : encore suivi à cette date

caution-age_out_of_range = { $n } âges inférieurs à 0 ou supérieurs à { $oldest } comptent comme non renseignés.
caution-all_censored = Aucun des { $n } patients n’est décédé. La survie ne peut pas baisser ; étudiez une autre issue ou vérifiez le sens des valeurs.
caution-all_set_aside = Toutes les lignes ({ $rows }) ont été écartées. Voyez les raisons : sans doute une colonne ou la façon d’écrire les dates a-t-elle été mal choisie.
caution-birth_dates_unreadable = { $n } dates de naissance de « { $heading } » n’ont pas pu être lues ; l’âge y compte comme non renseigné.
caution-buddhist_years = { $n } années de « { $heading } » sont comptées selon l’ère bouddhique ; 543 a été retranché.
caution-closing_long_after_last = La dernière date du fichier est le { $last }, { $days } jours avant la clôture. La date de clôture est-elle juste ?
caution-dates_against_order = { $n } dates de « { $heading } » ne suivent pas l’ordre des autres et ont été écartées.
caution-day_zero = { $n ->
    [one] Un patient a été vu pour la dernière fois
   *[other] { $n } patients ont été vus pour la dernière fois
  } le jour même du début (lignes { $lines }…).
caution-doubled_headings = Ces en-têtes figurent plusieurs fois : { $headings }.
caution-encoding_assumed = Les caractères ont été lus en { $encoding }. Si des noms paraissent faux, enregistrez le fichier en UTF-8.
caution-formulas_without_value = { $n } cellules contiennent une formule sans valeur enregistrée et ont été lues comme vides. Ouvrez et enregistrez d’abord le classeur dans son tableur.
caution-hidden_columns = { $n } colonnes sont masquées dans le classeur ; elles ont été lues.
caution-hidden_rows = { $n } lignes sont masquées ou filtrées dans le classeur ; elles ont été lues.
caution-hidden_sheets = Le classeur a des feuilles masquées : { $sheets }.
caution-long_rows = { $n ->
    [one] Une ligne a
   *[other] { $n } lignes ont
  } plus de cellules que d’en-têtes (lignes { $lines }…) : des colonnes y sont peut-être décalées.
caution-many_after_closing = { $n } patients commencent après la date de clôture. Est-elle juste ?
caution-many_levels = « { $heading } » a { $levels } valeurs différentes : trop pour comparer des groupes.
caution-merged_cells = { $n } cellules fusionnées : seule la première de chacune contient la valeur.
caution-no_headings = Il n’y a pas d’en-têtes ; les colonnes sont numérotées.
caution-nul_bytes = { $n } caractères vides (NUL) ont été retirés.
caution-number_style_unsettled = Dans « { $heading } », une virgule ou un point peut séparer milliers ou décimales ; « { $decimal } » a été pris pour les décimales.
caution-one_patient_only = Il ne reste qu’un patient. Les résultats concernent des groupes.
caution-order_against_evidence = L’ordre choisi pour « { $heading } » ({ $order }) contredit les dates qui s’y trouvent.
caution-preamble = { $n ->
    [one] Une ligne au-dessus des en-têtes a été laissée de côté.
   *[other] { $n } lignes au-dessus des en-têtes ont été laissées de côté.
  }
caution-quotes_unbalanced = Un guillemet ouvert à la ligne { $line } n’est jamais fermé ; les guillemets ont été lus comme des caractères ordinaires.
caution-repeated_headings = Les en-têtes sont répétés dans la liste ({ $n }) ; ces lignes ne sont pas des patients.
caution-sex_without_meaning = { $n } lignes ont un sexe qui n’a reçu aucun sens ({ $values }).
caution-short_rows = { $n ->
    [one] Une ligne a
   *[other] { $n } lignes ont
  } moins de cellules que d’en-têtes (lignes { $lines }…) ; le reste a été lu comme vide.
caution-subtotal_rows = Des lignes de totaux ont été trouvées ({ $n }) ; ce ne sont pas des patients.
caution-text_in_numbers = Dans « { $heading } », { $n } cellules ne sont pas des nombres ({ $examples }) et comptent comme non renseignées.
caution-two_digit_years = { $n } années à deux chiffres ({ $headings }) ont été placées entre { $first } et { $last }.
caution-unnamed_columns = Colonnes sans en-tête : { $columns }.
caution-unreadable_characters = { $n } caractères n’ont pas pu être lus.
caution-unseen_for_long = { $n ->
    [one] Un patient compte
   *[other] { $n } patients comptent
  } comme suivis mais ont été vus pour la dernière fois plus de { $days } jours avant la clôture (lignes { $lines }…). Ils sont peut-être perdus de vue.
caution-values_not_listed = Seules les { $listed } valeurs les plus fréquentes sur { $distinct } sont listées ; les autres n’ont pas de sens.
caution-list_shortened = { $listed } lignes sur { $n } sont listées ; toutes sont comptées.
caution-levels_not_listed = { $covariate } a { $levels } valeurs ; { $listed } sont listées.

refusal-compressed_file = C’est un fichier compressé. Décompressez-le et ouvrez la liste qu’il contient.
refusal-date_order_unsettled = Choisissez comment les dates de « { $heading } » sont écrites : rien ne montre si le jour ou le mois vient en premier.
refusal-empty_file = Le fichier est vide.
refusal-file_too_large = Le fichier est plus grand que ce que cette page peut ouvrir (la limite est 200 Mo). Enregistrez seulement la liste des patients dans un fichier à part.
refusal-no_end_column = Choisissez la colonne du dernier contact ou de la fin.
refusal-no_outcome_column = Choisissez la colonne de l’issue.
refusal-no_start_column = Choisissez la colonne du début du suivi.
refusal-no_readable_dates = Rien dans « { $heading } » ne se lit comme une date (par exemple { $examples }). Choisissez une autre colonne pour le début.
refusal-no_such_line = La ligne { $given } ne contient pas d’en-têtes.
refusal-no_such_sheet = Le classeur n’a pas de feuille « { $given } ».
refusal-not_a_table = Ce n’est pas une liste lisible. Enregistrez-la depuis son logiciel en .xlsx ou .csv.
refusal-not_text = Ce n’est ni un fichier texte ni un classeur. Enregistrez la liste depuis son logiciel en .xlsx ou .csv.
refusal-not_a_date = « { $given } » n’est pas une date.
refusal-role_given_twice = Plusieurs colonnes servent de « { $role } ». Choisissez-en une.
refusal-too_many_cells_in_file = La liste a plus de { $most } cellules, plus que cette page ne peut contenir.
refusal-too_many_columns = La liste a { $columns } colonnes ; on peut en lire au plus { $most }.
refusal-too_many_rows = La liste a plus de { $most } lignes, plus que cette page ne peut contenir.
refusal-unknown_column = Le fichier n’a pas cette colonne.
refusal-workbook_binary = C’est un classeur binaire (.xlsb). Enregistrez-le en .xlsx.
refusal-workbook_bomb = Ce classeur se décompresse en { $ratio } fois sa taille, ce que ne fait aucune liste de patients. Il n’a pas été ouvert.
refusal-workbook_damaged = Le classeur est abîmé et ne peut pas être lu. Ouvrez-le dans son tableur et enregistrez-le à nouveau.
refusal-workbook_encrypted = Le classeur est protégé par un mot de passe. Enregistrez-en une copie sans mot de passe, et supprimez-la ensuite.
refusal-workbook_entities = Le classeur contient des définitions qu’aucun tableur n’écrit. Il n’a pas été ouvert.
refusal-workbook_macros = Le classeur contient des macros. Enregistrez-le en .xlsx, sans macros.
refusal-workbook_old_form = C’est un classeur d’ancien type (.xls). Enregistrez-le en .xlsx.
refusal-workbook_too_large = Décompressé, le classeur dépasse ce que cette page peut contenir. Enregistrez seulement la liste des patients dans un classeur à part.
refusal-workbook_too_many_parts = Le classeur a { $parts } parties, plus qu’il n’en faut pour une liste de patients. Il n’a pas été ouvert.
refusal-workbook_without_sheets = Le classeur n’a aucune feuille avec des cellules.

## Outcomes

outcomes-title = Ce que sont devenus les patients
outcomes-lead = Choisissez les issues qui comptent comme événement et, si vous voulez, une colonne pour comparer des groupes. Tout ce qui suit en découle.

axis-years-since-start = Années depuis le début
row-atRisk = À risque
row-events = Événem.
row-censored = Censurés
group = Groupe
years-since-start = Années depuis le début
standard-error = Erreur type
lost = Perdus de vue
events-so-far = Événements jusque-là
censored-so-far = Censurés jusque-là
beyond-follow-up = au-delà du suivi
count-share = { $count } ({ $share })
from-to = { $lower } à { $upper }
sentence-group = { $group } : {""}
levels-left-out = Laissés de côté car personne n’en fait partie : { $levels }.

survival-title = Survie au cours du temps
survival-sentence-deaths = { $group }{ $survival } étaient en vie { $years ->
    [one] { $years } an
   *[other] { $years } ans
  } après le début (intervalle à 95 % : { $interval }), d’après { $n } patients et { $events } décès.
survival-sentence-other = { $group }{ $survival } n’avaient pas connu l’événement choisi { $years ->
    [one] { $years } an
   *[other] { $years } ans
  } après le début (intervalle à 95 % : { $interval }), d’après { $n } patients et { $events } événements.
survival-sentence-short = { $group }le suivi de ces { $n } patients est inférieur à un an ; lisez la courbe jusqu’où elle va.
median-reached = La moitié l’avait connu à { $median } ans (intervalle à 95 % : { $lower } à { $upper }).
median-reached-open = La moitié l’avait connu à { $median } ans (intervalle à 95 % : à partir de { $lower } ; limite supérieure non atteinte).
median-unsupported = La moitié ne l’avait connu qu’après que moins de 10 patients étaient encore suivis : pas de médiane.
median-not-reached = Moins de la moitié l’avait connu à la fin du suivi : il n’y a pas de médiane.
survival-figure-deaths = Part encore en vie, selon les années depuis le début
survival-figure-other = Part n’ayant pas connu l’événement, selon les années depuis le début
survival-figure-described = { $curves ->
    [one] Une courbe en escalier descendante avec sa bande à 95 % ; les effectifs à risque sont en dessous et le tableau derrière la figure contient toutes les valeurs.
   *[other] { $curves } courbes en escalier descendantes avec leurs bandes à 95 % ; les effectifs à risque sont en dessous et le tableau derrière la figure contient toutes les valeurs.
  }
survival-counts-caption = À risque, événements et censurés à chaque année
survival-at-years-caption = Survie à des moments choisis, avec limites à 95 %
survival-heading-deaths = En vie
survival-heading-other = Sans l’événement
losses-caption = Ce que les perdus de vue pourraient changer
losses-note = La vérité se trouve entre les deux colonnes. La courbe ci-dessus suppose que les perdus de vue ressemblent à ceux qui sont restés ; en cas de doute, citez les deux colonnes.
if-all-lost-died = Si tous avaient connu l’événement au dernier contact
if-none-lost-died = Si aucun, jusqu’à la date de clôture
no-losses = Personne n’a été perdu de vue : les pertes ne changent rien ici.
interval-kind = Type d’intervalle de confiance
interval-log-log = log-log (choix habituel)
interval-log = log
interval-plain = simple
survival-method = Produit-limite (Kaplan & Meier 1958), variance de Greenwood (1926), limites { $interval } ; là où la courbe est restée à 100 % ou a atteint 0 %, limites bêta-produit (Fay et coll. 2013). Les événements précèdent les censures du même jour. La médiane est le premier moment où la courbe est à 50 % ou moins (Brookmeyer & Crowley 1982). Tracée tant qu’au moins 10 sont à risque ; les petits traits marquent les patients censurés.

life-table-title = Table de survie
life-table-caption = Table de survie actuarielle
life-table-caption-group = Table de survie actuarielle : { $group }
life-table-step = Longueur des intervalles
step-year = Années
step-quarter = Trimestres
step-month = Mois
interval-years = Années
interval-months = Mois
interval-from-to = { $from } à { $to }
entering = Entrants
withdrawn = Autres sorties
events = Événements
effective = Effectif corrigé
chance = Probabilité dans l’intervalle
odds = Cote dans l’intervalle
survival-to-end = Survie à la fin (limites à 95 %)
hazard-per-year = Risque instantané par an
life-table-method = Méthode actuarielle (Berkson & Gage 1950 ; Cutler & Ederer 1958) : les perdus de vue et autres sorties d’un intervalle comptent pour moitié. Erreur type de Greenwood ; risque instantané au milieu de l’intervalle (Gehan 1969).

leaving-title = Toutes les façons de sortir
leaving-sentence = { $group }après { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }, { $stayed } étaient encore suivis ; la sortie la plus fréquente était « { $way } », avec { $share }.
leaving-sentence-nobody = { $group }personne n’est encore sorti.
leaving-figure = Où en sont les patients, selon les années depuis le début : { $group }
leaving-figure-described = Une aire empilée : ceux encore suivis en bas, au-dessus { $ways ->
    [one] une façon de sortir
   *[other] { $ways } façons de sortir
  }, toujours 100 % ensemble. Le tableau ci-dessous contient les valeurs.
leaving-caption = Incidence cumulée de chaque façon de sortir, avec limites à 95 % : { $group }
leaving-note = La dernière colonne montre ce que « un moins la survie » dirait à tort, comme si les autres sorties n’existaient pas. Ne la citez pas.
way-of-leaving = Façon de sortir
events-in-all = En tout
by-years = À { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }
one-minus-survival = Un moins la survie à { $years } (trop élevé)
leaving-method = Aalen & Johansen (1978), toutes les façons de sortir à la fois ; variance selon Marubini & Valsecchi (1995).

refusal-no_patients = Il n’y a aucun patient à décrire.
refusal-one_patient = Un patient seul n’est pas décrit ici : les résultats concernent des groupes. Regardez le dossier lui-même.
refusal-nobody_at_risk = Personne n’a été observé ne serait-ce qu’un jour : rien ne peut être dit du temps.
refusal-too_many_groups = { $covariate } compte { $groups } groupes ; on en distingue au plus { $most }. Regroupez-en dans le registre ou choisissez une autre colonne.
refusal-groups_too_small = Aucun groupe de { $covariate } n’a au moins deux patients. Choisissez une autre colonne.
caution-no_events = { $level } : personne sur { $n } n’a connu l’événement. La courbe reste à 100 % ; sa limite inférieure montre jusqu’où elle pourrait descendre.
caution-all_events_on_day_zero = { $level } : les { $events } événements tombent tous le premier jour. Vérifiez que les dates de début et de fin n’ont pas été confondues.
caution-last_at_risk_had_event = { $level } : la courbe tombe à 0 parce que le tout dernier patient observé a connu l’événement. N’en lisez pas la fin.
caution-never_at_risk = { $level } : { $n } patients vus tardivement ont commencé et fini leur observation le même jour et ne comptent nulle part.
caution-begins_late = { $level } : personne n’était observé avant le jour { $days }. La courbe ne concerne que ceux qui sont arrivés jusque-là.
caution-risk_set_emptied = { $level } : pendant un temps personne n’était observé (en dernier après le jour { $emptied_days }) ; la courbe repart au jour { $restart_days } et concerne ceux qui sont arrivés jusque-là.
caution-few_patients = { $level } : seulement { $n } patients. Un de plus ou de moins changerait beaucoup les chiffres.
caution-few_at_risk = { $level } : moins de 10 encore à risque à { $years } ans ({ $at_risk }). Ne vous appuyez pas sur ce chiffre.
caution-many_lost = { $level } : { $lost } perdus de vue ({ $share }). S’ils ont évolué moins bien que les autres, la vraie survie est plus basse : citez aussi les bornes.
caution-all_lost = { $level } : les { $n } patients ont tous été perdus de vue ; seules les bornes peuvent être données.
caution-lost_is_of_interest = Être perdu de vue compte ici comme événement ; les bornes des pertes n’ont alors aucun sens.
caution-few_effective = { $level } : moins de 10 effectivement à risque dans l’intervalle qui commence au jour { $from_days }. Ne lisez pas au-delà.
caution-nobody_left = { $level } : personne sur { $n } n’est encore sorti.
caution-group_not_recorded = { $n ->
    [one] Un patient n’a rien d’inscrit dans la colonne des groupes et n’est dans aucun groupe.
   *[other] { $n } patients n’ont rien d’inscrit dans la colonne des groupes et ne sont dans aucun groupe.
  }

rates-title = À quelle fréquence
rates-by = Selon
rates-by-year = l’année civile
rates-by-since_start = les années depuis le début
rates-by-age = l’âge
rates-sentence = { $group } : { $events } événements en { $years } personnes-années, soit { $rate } pour { $per } personnes-années (intervalle à 95 % : { $interval }).
rates-sentence-compared = { $group } : { $events } événements en { $years } personnes-années, soit { $rate } pour { $per } personnes-années (intervalle à 95 % : { $interval }), { $ratio } fois le taux de { $first } ({ $ratioInterval }).
rates-do-not-mean = Un taux compte les événements par temps d’observation ; ce n’est pas la proportion de ceux qui auront eu l’événement, et une moyenne sur des années où le risque change peut le cacher.
rates-figure = Événements pour { $per } personnes-années, avec limites à 95 %
rates-figure-described = Taux dans { $bands ->
    [one] une classe
   *[other] { $bands } classes
  } pour { $groups ->
    [one] tous ensemble
   *[other] { $groups } groupes
  } ; les nombres sont dans le tableau.
rates-caption = Événements pour { $per } personnes-années
rates-band = Dans
rate-per = Taux pour { $per } (limites à 95 %)
band-from = { $from } et plus
rates-standardised-caption = Taux standardisés sur l’âge pour { $per } personnes-années
rates-crude = Brut
standard-who_world = Population mondiale type de l’OMS 2000-2025
standard-segi = Population mondiale type de Segi
rates-unknown-age = { $n ->
    [one] Un patient sans âge n’est dans aucune classe d’âge.
   *[other] { $patients } patients sans âge ne sont dans aucune classe d’âge.
  }
rates-method = Le temps est découpé à chaque classe (Lexis) ; limites d’un taux Garwood (1936), d’un rapport exactes, conditionnelles à l’ensemble des événements ; standardisation directe, limites Fay et Feuer (1997). Poids de la population type de l’OMS : Ahmad et autres (2001).
caution-few_events_in_rate = { $level } : seulement { $events } événements, un patient de plus ou de moins change nettement le taux.
caution-standard_cut_short = Les âges observés portent { $share } du poids de la population type ; celle-ci a été réduite à ces âges, et le chiffre ne se compare qu’à d’autres réduits de même.
caution-standard_thin = Des âges où moins de 10 personnes-années ont été vécues portent { $share } du poids de la population type : un seul événement y change beaucoup le taux standardisé, et sa limite supérieure dit combien on en sait peu.
refusal-age_not_known = Le registre n’a pas d’âge. Choisissez une colonne avec l’âge ou la date de naissance dans Registre.
refusal-uneven_weights = Une population type demande un poids par classe d’âge.

mean-time-title = Combien de temps en moyenne, et ce qui reste à venir
mean-time-empty = Saisissez un nombre d’années.
mean-time-horizon = Jusqu’à tant d’années
mean-time-horizon-hint = À choisir avant de regarder. Laissé vide : cinq ans, ou aussi loin que vont tous les groupes.
mean-time-further = Années à venir
mean-time-sentence-deaths = { $group } : en { $horizon } ans, les patients ont vécu en moyenne { $mean } ans (intervalle à 95 % : { $interval }).
mean-time-sentence-other = { $group } : en { $horizon } ans, les patients ont passé en moyenne { $mean } ans sans l’événement (intervalle à 95 % : { $interval }).
mean-time-sentence-compared-deaths = { $group } : en { $horizon } ans, les patients ont vécu en moyenne { $mean } ans (intervalle à 95 % : { $interval }), soit { $difference } ans d’écart avec { $first } ({ $between }).
mean-time-sentence-compared-other = { $group } : en { $horizon } ans, les patients ont passé en moyenne { $mean } ans sans l’événement (intervalle à 95 % : { $interval }), soit { $difference } ans d’écart avec { $first } ({ $between }).
mean-time-caption = Moyennes en { $horizon } ans (limites à 95 %)
mean-time-deaths = Années vécues
mean-time-other = Années sans l’événement
mean-time-lost = Années perdues
mean-time-difference = Écart avec le premier
ahead-caption-deaths = En vie { $years } ans plus tard, parmi ceux arrivés jusque-là
ahead-caption-other = Sans l’événement { $years } ans plus tard, parmi ceux arrivés jusque-là
ahead-survived = Années depuis le début
ahead-share = Proportion (limites à 95 %)
ahead-few_survivors = moins de 10 restants
ahead-beyond_follow_up = au-delà du suivi
mean-time-does-not-mean = Une moyenne dans un horizon ne suppose pas de risques proportionnels : elle se compare même si les courbes se croisent ; elle ne dit rien des années suivantes.
mean-time-method = Aire sous la courbe produit-limite (Irwin 1949 ; Royston et Parmar 2013) ; survie conditionnelle avec la variance de Greenwood des années suivantes (Zabor et autres 2013).
refusal-horizon_beyond_follow_up = Toutes les courbes ne vont pas si loin : la plus courte s’arrête après { NUMBER($years, maximumFractionDigits: 1) } ans. Choisissez une année plus précoce.
refusal-curve_restarts = Personne n’était observé pendant un certain temps : la courbe ne va pas d’un trait depuis le début et n’a pas de moyenne.

tipping-title = Si les perdus de vue ont évolué autrement
tipping-years = Survie à tant d’années
tipping-sentence = { $group }, { $lost } perdus de vue sur { $n } : { $alike } sans l’événement à { $years } ans s’ils ont évolué comme ceux restés, { $double } si leur risque était double, { $most } s’il était { $times } fois plus élevé.
tipping-clear-tips = L’écart entre { $group } et { $first } n’est plus net si les perdus de vue de { $better } avaient environ { $times } fois le risque de ceux restés.
tipping-clear-holds = L’écart entre { $group } et { $first } reste net même si les perdus de vue de { $better } avaient { $times } fois le risque de ceux restés.
tipping-unclear-tips = Pas d’écart net entre { $group } et { $first } en l’état ; il y en aurait un si les perdus de vue de { $better } avaient environ { $times } fois le risque de ceux restés.
tipping-unclear-holds = Pas d’écart net entre { $group } et { $first }, et il n’y en aurait pas non plus si les perdus de vue de { $better } avaient { $times } fois le risque de ceux restés.
tipping-does-not-mean = Personne ne sait ce que sont devenus les perdus de vue si l’on n’en recherche pas une partie. Demandez-vous pour chaque multiple s’il est plausible ici.
tipping-figure = Sans l’événement à { $years } ans, selon l’évolution des perdus de vue
tipping-figure-described = { $groups ->
    [one] Une ligne avec sa bande à 95 %, qui baisse à mesure que l’on suppose une évolution plus mauvaise ; le tableau contient les valeurs.
   *[other] { $groups } lignes avec leurs bandes à 95 %, qui baissent à mesure que l’on suppose une évolution plus mauvaise ; le tableau contient les valeurs.
  }
axis-delta = Risque des perdus de vue (fois)
tipping-delta = Risque des perdus de vue, en multiple de celui de ceux restés
tipping-caption = Sans l’événement à { $years } ans (limites à 95 %), selon le risque des perdus de vue
tipping-method = Après leur dernière visite, les perdus de vue restent à risque avec un risque multiple de celui des autres (Zhao et autres 2014 ; Lipkovich et autres 2016), calculé comme une espérance. Limites d’après { $resamples } rééchantillonnages des patients, graine { $seed }. À 1, c’est la méthode produit-limite ; même 10 n’est pas le pire cas, indiqué à côté de la courbe plus haut.
caution-left_out_of_tipping = { $level } est laissé de côté ici : moins de { $least } événements à ce moment, ou personne de suivi depuis le début jusque-là.
refusal-too_few_to_tip = À { $years } ans, aucun groupe n’a { $least } événements et un suivi depuis le début. Choisissez une autre année, ou fiez-vous aux bornes à côté de la courbe.
refusal-lost_is_the_outcome = Être perdu de vue fait partie des événements comptés : rien n’est inconnu ici à leur sujet.

## Compare

compare-title = Comparer

compare-lead = Un groupe s’en est-il mieux sorti qu’un autre ? D’abord simplement, puis en tenant compte de ce qui les distingue par ailleurs. Rien ici ne montre que le groupe en est la cause.
compare-choose-group = Choisissez ci-dessus une colonne pour former les groupes.
compare-exposed = Groupe étudié
compare-reference = Comparé à
patients = Patients
measure = Mesure
p-value = p
test = Test
chi-squared = Khi-deux
degrees-of-freedom = Degrés de liberté

difference-title = La différence de survie
difference-sentence = Après { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }, { $inExposed } dans « { $exposed } » et { $inReference } dans « { $reference } » n’avaient pas connu l’événement : une différence de { $difference } points de pourcentage (intervalle à 95 % : { $interval }).
difference-caption = Sans l’événement à des moments choisis, et la différence
difference-points = Différence, points de pourcentage
difference-method = Différence de deux estimations produit-limite ; les variances des deux groupes s’ajoutent (Greenwood 1926). Sans aucun ajustement.

rank-test-title = Les courbes peuvent-elles différer par hasard ?
rank-sentence-differ = Sur l’ensemble du suivi, les groupes diffèrent plus que le hasard ne l’expliquerait facilement (khi-deux { $chi }, { $df ->
    [one] { $df } degré
   *[other] { $df } degrés
  } de liberté, p { $p }).
rank-sentence-may-be-chance = Sur l’ensemble du suivi, le hasard seul pourrait expliquer la différence entre les groupes (khi-deux { $chi }, { $df ->
    [one] { $df } degré
   *[other] { $df } degrés
  } de liberté, p { $p }).
rank-does-not-mean = La valeur de p n’est pas la taille d’une différence, et une grande valeur ne montre pas que les groupes sont semblables.
rank-caption = Événements observés, et attendus si tous les groupes avaient les mêmes risques
observed = Observés
expected = Attendus
observed-to-expected = Observés / attendus
rank-weight = Poids donné à chaque moment
rank-weight-hint = À choisir avant de regarder le résultat.
rank-log_rank = Égal : log-rank
rank-gehan = Effectif à risque : Gehan
rank-tarone_ware = Sa racine carrée : Tarone-Ware
rank-fleming_harrington = Puissances de la survie : Fleming-Harrington
rank-method-log_rank = Test du log-rank (Mantel 1966 ; Peto & Peto 1972), variance hypergéométrique.
rank-method-gehan = Test de Wilcoxon généralisé par Gehan : les poids sont les effectifs à risque, les différences précoces comptent davantage.
rank-method-tarone_ware = Tarone & Ware (1977) : les poids sont les racines carrées des effectifs à risque.
rank-method-fleming_harrington = Fleming & Harrington (1991), poids S(t−)^{ $rho } (1 − S(t−))^{ $gamma }, S commune à tous les groupes.
rank-peto_peto = Survie jusque-là, selon Peto et Peto
rank-rho = Puissance de la survie jusque-là
rank-rho-hint = Au-dessus de 0 : les différences précoces comptent davantage.
rank-gamma = Puissance de ce qui est perdu
rank-gamma-hint = Au-dessus de 0 : les différences tardives comptent davantage.
rank-power-fault = Entre 0 et { $greatest }.
rank-stratify = Comparer au sein des modalités de
rank-stratify-hint = Les patients ne sont comparés qu’à ceux de la même modalité.
rank-stratify-none = Aucune colonne
rank-ordered = Les groupes ont-ils un ordre ?
rank-ordered-hint = Seulement un ordre connu avant de regarder.
rank-ordered-no = Non
rank-ordered-yes = Oui, par des scores
rank-score-of = Score de « { $level } »
rank-score-fault = Il manque un nombre.
rank-stratified = Comparaison au sein des modalités de « { $covariate } » : p { $p }. Sans cela : p { $crude }. Si les deux ne concordent pas, la colonne explique une partie de la différence, ou la cachait.
rank-trend-up = Dans l’ordre des groupes, les événements viennent d’autant plus vite que le score est élevé (z { $z }, p { $p }).
rank-trend-down = Dans l’ordre des groupes, les événements viennent d’autant plus lentement que le score est élevé (z { $z }, p { $p }).
rank-trend-chance = Le hasard seul pourrait expliquer la tendance observée dans l’ordre des groupes (z { $z }, p { $p }). Un groupe du milieu peut malgré tout différer des deux extrêmes.
rank-pairs-caption = Chaque paire de groupes pour elle-même, puis ajustée parce que { $n ->
    [one] { $n } paire est comparée
   *[other] { $n } paires sont comparées
  }
rank-pair = Groupes
rank-pair-of = { $first } et { $second }
adjusted-p = p ajusté
not-tested = non testé
rank-method-peto_peto = Test de Wilcoxon généralisé par Peto & Peto (1972) : les poids sont le produit des 1 − d/(n + 1), les différences précoces comptent davantage.
rank-method-stratified = Scores et variances sont additionnés sur les strates.
rank-method-trend = Test de tendance de Tarone (1975).
rank-method-pairs = Paires ajustées selon Holm (1979).
caution-curves_cross = Les courbes de « { $first } » et de « { $second } » se croisent à environ { NUMBER($years, maximumFractionDigits: 1) } ans ; avant, « { $above } » était au-dessus. Un seul test ou un seul rapport pour tout le suivi le cache : comparez à des moments choisis, ou par le temps moyen dans un horizon.
caution-stratum_not_recorded = { $n ->
    [one] { $n } patient n’a
   *[other] { $n } patients n’ont
  } rien dans la colonne au sein de laquelle on compare, et { $n ->
    [one] est laissé
   *[other] sont laissés
  } de côté.
caution-strata_say_nothing = { $n ->
    [one] Une modalité ne dit
   *[other] { $n } modalités ne disent
  } rien, car un seul groupe s’y trouve ou personne n’y a eu l’événement : { $strata }. Regroupez les modalités si elles sont nombreuses.
refusal-stratified_by_itself = On ne peut pas comparer les groupes au sein des modalités de la colonne qui les forme. Choisissez une autre colonne.
refusal-score_missing = « { $level } » n’a pas de score. Donnez un nombre à chaque groupe.
refusal-scores_alike = Tous les groupes ont le même score, il n’y a donc pas d’ordre. Donnez-leur des nombres différents.

intervals-title = Intervalle par intervalle
intervals-lead = Parmi ceux qui ont commencé chaque intervalle dans « { $exposed } » et dans « { $reference } », combien y ont connu l’événement. Les perdus de vue et autres sorties d’un intervalle comptent pour moitié.
intervals-caption = Événements sur effectifs corrigés dans chaque intervalle de suivi (limites à 95 %)
risk-ratio = Rapport des risques
odds-ratio = Rapport des cotes
risk-difference = Différence des risques, points de pourcentage
intervals-left-out = Laissés hors des chiffres regroupés car un groupe ou un événement y manque : { $intervals }.
intervals-method = Effectifs corrigés n − w/2 (Cutler & Ederer 1958) ; limites du rapport des risques Katz (1978), du rapport des cotes Woolf (1955), de la différence Newcombe (1998) ; regroupement par Mantel & Haenszel (1959), variances de Robins, Breslow & Greenland (1986) et Greenland & Robins (1985).
pooled-caption = Regroupé sur les strates (Mantel-Haenszel, limites à 95 %)
pooled-sentence = Au total, le risque dans « { $exposed } » était { $ratio } fois celui de « { $reference } » (intervalle à 95 % : { $interval } ; p { $p }).
odds-are-not-risks = Un rapport des cotes n’est pas un rapport des risques : quand l’événement est fréquent, il s’éloigne davantage de 1. Citez le rapport et la différence des risques.
crude = Brut
pooled = Regroupé
strata-agree = Les strates concordent assez pour être regroupées (Breslow-Day corrigé par Tarone : khi-deux { $chi }, degrés de liberté { $df }, p { $p }).
strata-differ = Les strates diffèrent entre elles (Breslow-Day corrigé par Tarone : khi-deux { $chi }, degrés de liberté { $df }, p { $p }) : lisez-les une à une ; le chiffre regroupé masque la différence.

cox-title = En tenant compte d’autres facteurs
cox-choose-covariates = Cochez ce dont il faut tenir compte.
cox-covariates = Tenir compte de
cox-covariates-hint = Seulement ce qui était connu au début. Laissez de côté ce que le groupe a pu lui-même modifier.
cox-reference = { $covariate } : comparé à
cox-per = { $covariate } : par
cox-ties = Événements le même jour
cox-ties-efron = Efron (choix habituel)
cox-ties-breslow = Breslow
cox-term-level = { $covariate } : { $level } contre { $reference }
cox-term-number = { $covariate }, par { $per }
cox-sentence-higher = { $term } : l’événement est venu plus tôt ; à tout moment, son risque instantané était { $ratio } fois aussi élevé (intervalle à 95 % : { $interval } ; p { $p }){ $others ->
    [0] , sans tenir compte d’autre chose.
   *[other] , les autres covariables étant égales.
  }
cox-sentence-lower = { $term } : l’événement est venu plus tard ; à tout moment, son risque instantané était { $ratio } fois aussi élevé (intervalle à 95 % : { $interval } ; p { $p }){ $others ->
    [0] , sans tenir compte d’autre chose.
   *[other] , les autres covariables étant égales.
  }
cox-sentence-unclear = { $term } : pas de différence nette ; le rapport des risques instantanés est { $ratio }, mais tout ce qui va de { $interval } est compatible avec ces données (p { $p }){ $others ->
    [0] , sans tenir compte d’autre chose.
   *[other] , les autres covariables étant égales.
  }
cox-does-not-mean = Un rapport des risques instantanés n’est ni un rapport de risques ni un rapport de cotes, et ne dit pas combien : lisez-le avec la différence de survie ci-dessus.
cox-figure = Rapports des risques instantanés avec limites à 95 %
cox-figure-described = { $terms ->
    [one] Un rapport des risques instantanés avec ses limites
   *[other] { $terms } rapports des risques instantanés avec leurs limites
  } sur une échelle logarithmique ; le tableau ci-dessous contient les valeurs.
axis-hazard-ratio = Rapport des risques instantanés (1 = aucune différence)
cox-caption = Régression de Cox
covariate = Covariable
coefficient = Coefficient
hazard-ratio = Rapport des risques instantanés (limites à 95 %)
cox-fit = { $n } patients, { $events } événements. Concordance { $concordance } : la part des paires de patients que le modèle range dans le bon ordre.
cox-tests-caption = Tests du modèle entier
test-likelihood_ratio = Rapport de vraisemblance
test-wald = Wald
test-score = Score
proportional = Les rapports peuvent être tenus pour constants dans le temps (test du score des risques proportionnels : khi-deux { $chi }, degrés de liberté { $df }, p { $p }).
not-proportional = Les rapports changent au cours du temps (test du score des risques proportionnels : khi-deux { $chi }, degrés de liberté { $df }, p { $p }) : chacun n’est qu’une moyenne, et la différence de survie ci-dessus en dit plus.
cox-left-out = Laissées de côté car elles ne varient pas ou répètent ce que d’autres disent déjà : { $covariates }.
cox-method-efron = Cox (1972), ex æquo selon Efron (1977), limites de Wald ; risques proportionnels par le test du score de Grambsch & Therneau (1994).
cox-method-breslow = Cox (1972), ex æquo selon Breslow (1974), limites de Wald ; risques proportionnels par le test du score de Grambsch & Therneau (1994).

caution-few_events_in_group = { $level } : seulement { $events ->
    [0] aucun événement
    [one] un événement
   *[other] { $events } événements
  }. La comparaison tient à un ou deux patients.
caution-common_in_interval = L’événement est fréquent dans les intervalles (jusqu’à { $share }) : ne lisez pas le rapport des cotes regroupé comme un rapport de risques, instantanés ou non.
caution-strata_differ = Les strates diffèrent entre elles (p { NUMBER($p, maximumFractionDigits: 3) }) : regardez-les une à une avant de citer un chiffre regroupé.
caution-half_added = { $strata ->
    [one] Dans une strate
   *[other] Dans { $strata } strates
  }, une case est vide ; un demi y a été ajouté pour le test de Woolf.
caution-few_events = Seulement { $events } événements pour { $parameters } coefficients : moins de 10 pour chacun. Tenez compte de moins de facteurs, ou lisez le résultat comme un indice.
caution-not_proportional = Les rapports changent au cours du temps (p { NUMBER($p, maximumFractionDigits: 3) }). Un seul nombre pour tout le suivi le cache ; regardez les courbes.
caution-covariate_missing = { $n ->
    [one] Un patient
   *[other] { $n } patients
  } aux données incomplètes ont été laissés de côté ; s’ils diffèrent des autres, le résultat penche.
refusal-one_group = Il n’y a qu’un seul groupe. Choisissez une colonne à deux groupes ou plus.
refusal-no_events_to_compare = Personne n’a connu l’événement : il n’y a rien à comparer.
refusal-nothing_to_compare = À aucun moment deux groupes n’étaient observés ensemble : ils ne peuvent pas être comparés.
refusal-same_group = Choisissez deux groupes différents.
refusal-unknown_level = « { $level } » n’est pas un groupe de { $covariate } qui puisse être comparé.
refusal-no_strata = Il n’y a encore rien à comparer.
refusal-no_usable_strata = Aucune strate, aucun intervalle ne contient des patients des deux groupes.
refusal-exact_needs_whole_numbers = Les chiffres exacts demandent des nombres entiers.
refusal-no_covariates = Cochez au moins une covariable.
refusal-covariate_twice = { $covariate } figure deux fois.
refusal-per_not_positive = Le pas de { $covariate } doit dépasser 0.
refusal-nobody_complete = Aucun patient n’a toutes les covariables cochées. Cochez-en moins.
refusal-nothing_varies = { $covariate } est identique pour tous. Cochez une autre covariable.
refusal-reference_is_empty = Personne n’est dans « { $level } » de { $covariate }. Comparez à une autre catégorie.
refusal-too_few_events = { $events } événements ne suffisent pas pour { $parameters } coefficients : il en faut au moins 3 pour chacun, mieux 10. Cochez moins de covariables.
refusal-level_without_events = Personne dans « { $level } » de { $covariate } n’a connu l’événement : son rapport n’a pas de fin. Fusionnez cette catégorie avec une autre dans le registre, ou laissez la covariable de côté.
refusal-separation = { $covariate } sépare complètement ceux qui ont connu l’événement des autres : son rapport n’a pas de fin. Fusionnez des catégories ou laissez-la de côté.
refusal-no_convergence = Les estimations ne se sont pas stabilisées après { $steps } étapes. Prenez moins de covariables en compte, ou cherchez celle qui en répète presque une autre.

subdistribution-title = Quand d’autres issues surviennent avant
subdistribution-competing = Ces issues excluent l’événement
subdistribution-competing-hint = Issues après lesquelles il ne peut plus survenir. Les autres mettent seulement fin à l’observation.
subdistribution-sentence-higher = { $term } : davantage ont eu l’événement. Le rapport des risques instantanés de sous-distribution est de { $ratio } (intervalle à 95 % : { $interval }), d’après { $events } événements chez { $n } patients, dont { $competing } sont sortis d’une façon qui l’excluait.
subdistribution-sentence-lower = { $term } : moins ont eu l’événement. Le rapport des risques instantanés de sous-distribution est de { $ratio } (intervalle à 95 % : { $interval }), d’après { $events } événements chez { $n } patients, dont { $competing } sont sortis d’une façon qui l’excluait.
subdistribution-sentence-unclear = { $term } : pas de différence nette du nombre de ceux qui ont eu l’événement. Le rapport des risques instantanés de sous-distribution est de { $ratio }, mais toute valeur dans { $interval } est compatible avec ces données ({ $events } événements chez { $n } patients, dont { $competing } sont sortis d’une façon qui l’excluait).
subdistribution-does-not-mean = Ce rapport indique dans quel sens évolue la probabilité de l’événement, compte tenu de ce qui survient avant ; ce n’est pas un rapport de probabilités. Les rapports propres à la cause disent ce qui arrive parmi ceux encore suivis. Un groupe peut sembler ici mieux protégé seulement parce que ses patients sortent plus tôt d’une autre façon : lisez les trois colonnes ensemble.
subdistribution-caption = Rapports avec limites à 95 %
subdistribution-ratio = Rapport des risques de sous-distribution
subdistribution-of-interest = Rapport des risques propre à la cause
subdistribution-of-competing = Rapport des risques propre à ce qui l’exclut
subdistribution-too-few-competing = Trop peu sont sortis d’une façon qui exclut l’événement pour un modèle à part.
subdistribution-method = Fine et Gray (1999), ex æquo selon Breslow, variance « sandwich » ; pondération des entrées tardives selon Geskus (2011). Propre à la cause : Cox (1972), ex æquo selon Efron.
caution-no_competing = Personne n’est sorti d’une façon qui exclut l’événement : le risque de sous-distribution est le risque ordinaire.
refusal-competing_is_interest = « { $meaning } » ne peut pas être à la fois l’événement et ce qui l’exclut.
refusal-weights_undefined = À un certain moment, personne n’était observé qui puisse représenter ceux venus plus tard : les poids de ce modèle ne sont pas définis. Écartez les entrées tardives, ou regardez les résultats propres à la cause.

compare-known = Quand a-t-on su qui appartient à quel groupe ?
compare-known-hint = Un groupe formé par quelque chose de postérieur au début (traitement commencé, visite faite) suppose d’avoir vécu jusque-là.
compare-known-start = au début du suivi
compare-known-later = seulement plus tard
compare-landmark = Compter à partir de tant de mois après le début
compare-landmark-hint = Seuls ceux encore suivis à ce moment sont comparés, dans les groupes connus à ce moment.
alike-title = Les groupes se ressemblent-ils ?
alike-sentence = { $exposed } ({ $exposedPatients } patients) et { $reference } ({ $referencePatients }) diffèrent nettement pour { $unlike } caractéristiques sur { $of }.
alike-sides-caption = Comment les groupes ont été suivis
alike-start = La moitié avait commencé avant le
alike-follow-up = Suivi médian, années
alike-lost = Perdus de vue
alike-caption = Caractéristiques des groupes
alike-method = Moyennes avec écarts types, effectifs avec proportions ; différences standardisées (Austin 2009), à prendre en compte au-delà de 0,1 (usage courant). Suivi par la méthode produit-limite inversée.
characteristic = Caractéristique
mean-of = { $covariate }, moyenne (écart type)
level-of = { $covariate } : { $level }
mean-and-spread = { $mean } ({ $spread })
count-and-share = { $n } ({ $percent })
standardised-difference = Différence standardisée
e-value = Pour expliquer entièrement cet écart, il faudrait un facteur absent du registre lié à la fois au groupe et à l’événement par des rapports de risques de { $estimate } chacun, en plus de ce qui a été pris en compte ; pour le rendre incertain, de { $limit } chacun{ $scale ->
    [common]  (l’événement est fréquent : le rapport a d’abord été ramené à l’échelle des risques)
   *[other] {""}
  }. Valeur E : VanderWeele et Ding (2017).
e-value-of-unclear = L’écart est déjà incertain : aucun facteur caché n’est nécessaire pour l’expliquer (valeur E de la limite { $limit }, de l’estimation { $estimate }{ $scale ->
    [common] , à l’échelle des risques
   *[other] {""}
  } ; VanderWeele et Ding 2017).
compare-found = Comment les patients ont-ils été trouvés ?
compare-found-hint = Par exemple par dépistage ou recherche de cas, ou parce qu’ils sont tombés malades.
compare-found-alike = De la même façon dans tous les groupes
compare-found-differently = De façons différentes
caution-found_differently = Les groupes ont été trouvés de façons différentes. Ceux que l’on trouve en cherchant la maladie sont trouvés plus tôt et vivent donc plus longtemps à partir de là, même si rien ne les a aidés (avance au diagnostic), et une recherche trouve davantage de cas lents. Comparez au sein des modalités d’une colonne qui dit comment ils ont été trouvés, ou comptez à partir d’un événement qui est le même pour tous.
caution-group_timing_not_said = Il n’a pas été dit quand les groupes ont été connus. S’ils résultent de quelque chose de postérieur au début, ceux du groupe ont dû vivre jusque-là, et la comparaison le flatte.
caution-counted_from_landmark = Compté à partir de { $days } jours après le début, parmi ceux encore suivis alors. Un groupe formé après ce jour ne doit pas servir ici.
caution-groups_unlike = Les groupes diffèrent par { $covariates } (différence standardisée jusqu’à { NUMBER($most, maximumFractionDigits: 2) }). Prenez-les en compte avant de croire à un écart de résultats.
caution-periods_differ = La moitié de { $level } a commencé { NUMBER($years, maximumFractionDigits: 1) } ans avant l’autre groupe : les soins ont pu changer entre-temps. Prenez en compte la période du début.
caution-follow_up_differs = { $level } a été suivi { NUMBER($times, maximumFractionDigits: 1) } fois plus longtemps : comparez seulement aussi loin que les deux ont été suivis.
caution-losses_differ = Davantage ont été perdus de vue dans { $level } ({ $share } contre { $other_share }). Si leur sort diffère de celui des autres, la comparaison penche.
refusal-group_known_later = Des groupes connus seulement après le début ne peuvent pas être comparés depuis le début : ceux du groupe ont dû vivre jusque-là. Choisissez à partir de combien de mois après le début compter.
refusal-nobody_at_landmark = Personne n’a été suivi plus de { $days } jours. Choisissez un repère plus précoce.
refusal-empty_group = Personne n’est dans « { $level } ». Choisissez un autre groupe.

## Caseload


caseload-title = Qui sera suivi
caseload-lead = À partir des arrivées et des sorties du registre lui-même : qui sera suivi, et ce que cela demande. Les taux du passé sont prolongés ; rien n’est su de ce qui ne s’est encore jamais produit.
calendar-year = Année
newcomers = Nouveaux
whole-year = Année complète
yes = oui
no = non
person-years = Personnes-années
left-in-all = Sortis en tout
staying = Restés jusqu’au bout
baseline = Comme aujourd’hui
under-care = Suivis
on-day = Au
year-to = Année jusqu’au
band-80 = 80 % des tirages
band-95 = 95 % des tirages
percent-sign = %
axis-years-from-closing = Années depuis la date de clôture

history-title = Ce que dit le passé
newcomers-sentence = Environ { $mean } patients par an sont arrivés ({ $lower } à { $upper }), d’après { $years ->
    [one] une année complète
   *[other] { $years } années complètes
  }.
newcomers-sentence-unknown = Aucune année complète ne permet de juger des arrivées. Saisissez un nombre ci-dessous.
newcomers-figure = Nouveaux patients selon l’année de première visite ici
newcomers-figure-described = Barres des nouveaux patients par année civile ; les années incomplètes sont vides et un trait pointillé marque la moyenne annuelle.
retention-sentence = { $staying } sont restés pendant { $years ->
    [one] la première année
   *[other] les { $years } premières années
  } ; la sortie la plus fréquente était alors « { $way } » ({ $share } des sorties).
retention-sentence-nobody = Personne n’est sorti pendant { $years ->
    [one] la première année
   *[other] les { $years } premières années
  }.
retention-caption = Sorties pour 100 patients-années de suivi, selon les années depuis le début
retention-note = À partir de { $years } ans depuis le début, trop peu a été observé : la dernière ligne est prolongée.
today-caption = Les { $total } patients suivis à la date de clôture, selon les années depuis le début
history-method = Arrivées : limites de Poisson (Garwood 1936), élargies quand les années diffèrent plus que le hasard ne l’explique. Sorties : événements rapportés aux personnes-années de chaque année depuis le début, par cause.

projection-title = Les années à venir
projection-needs-newcomers = Saisissez combien de nouveaux patients attendre chaque année.
caseload-years = Nombre d’années
caseload-basis = Nouveaux patients
caseload-basis-history = comme par le passé
caseload-basis-typed = saisis
caseload-per-year = Nouveaux par an
caseload-basis-trend = la tendance, amortie
caseload-basis-incidence = incidence × population
caseload-damping = Amortissement
caseload-damping-hint = Ce qui reste de la tendance après chaque année : 1 la prolonge, 0 l’arrête.
caseload-incidence = Nouveaux cas pour 100 000 par an
caseload-population = Population
caseload-growth = Croissance par an
caseload-completeness = Part des patients suivis que contient le registre
caseload-completeness-hint = Moins de 100 s’il manque des patients d’avant le registre.
caseload-tail = Au-delà de ce qui a été observé
caseload-tail-held = les derniers taux continuent
caseload-tail-halved = la moitié des derniers taux
caseload-tail-doubled = le double des derniers taux
caseload-tail-nobody = personne ne sort
beyond-seen = Ancienneté jamais observée
tail-held = Au-delà de { $years } ans depuis le début, trop peu a été observé : les derniers taux y sont prolongés (en gris dans la figure).
tail-halved = Au-delà de { $years } ans depuis le début, trop peu a été observé : la moitié des derniers taux y est utilisée, comme choisi (en gris dans la figure).
tail-doubled = Au-delà de { $years } ans depuis le début, trop peu a été observé : le double des derniers taux y est utilisé, comme choisi (en gris dans la figure).
tail-nobody = Au-delà de { $years } ans depuis le début, trop peu a été observé : personne n’y sort, comme choisi (en gris dans la figure).
projection-sentence = De { $today } aujourd’hui, environ { $value } seront suivis le { $ends } (95 tirages sur 100 : { $lower } à { $upper }).
projection-figure = Patients suivis, avec bandes pour 50, 80 et 95 tirages sur 100
projection-figure-described = Une ligne à partir du nombre d’aujourd’hui sur { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }, avec des bandes qui s’élargissent ; le tableau ci-dessous contient les valeurs.
projection-caption = Patients suivis à la fin de chaque année
projection-note = { $draws } tirages, germe { $seed } : le même germe donne les mêmes bandes.
projection-method = Les patients d’aujourd’hui sont prolongés selon leur ancienneté, les nouveaux selon la survie depuis l’arrivée (Capocaccia & De Angelis 1997 ; Verdecchia et coll. 2002), mois par mois ; taux et effectifs sont retirés à chaque tirage.

resources-title = Ce que cela demande
resources-type = Saisissez ce que demande un patient, ou ce dont on dispose.
resources-method = Nouveaux de chaque mois, patients dans leur première année, patients au-delà et événements, multipliés par ce qui a été saisi ; bandes de { $draws } tirages, germe { $seed }. Les lits occupés en moyenne sont les admissions multipliées par la durée de séjour (Little 1961) ; 95 jours sur 100, il n’y en a pas plus que le 95ᵉ centile de Poisson. Les pratiques sont supposées inchangées.
items-lead = Tout ce que demandent les soins, dans vos propres unités : consultations, examens, comprimés, heures, journées d’hospitalisation. Les quantités valent pour un patient.
items-caption = Ce que demande un patient
item-name = Quoi
item-unit = Unité
item-at_start = Une fois, au début
item-first_year = Chaque mois de la première année
item-later = Chaque mois ensuite
item-per_event = À chaque événement
item-event = Événement
item-unit_cost = Coût d’une unité
item-cost_growth = Hausse du coût, % par an
item-number = ligne { $number }
event-death = décès
event-lost = perte de vue
event-completed = guérison ou fin de traitement
event-stopped = arrêt volontaire
event-moved_away = départ ailleurs
lines-caption = Ce dont on dispose
line-name = Nom
line-what = De quoi
line-limit = Disponible
line-patients = Patients suivis en même temps
line-amount = { $name }, quantité par mois
line-beds = { $name } en journées : nombre de lits
line-unnamed = Cette limite
line-need = { $name } : besoin
line-need-now = Besoin du premier mois
line-need-last = Besoin du dernier mois
line-passed-in = Dépassée ce mois
line-passed-by = Déjà dépassée
line-passed-by-end = Dépassée à la fin
line-unlikely = Dépassée dans 1 tirage sur 10 dès
line-likely = Dépassée dans la moitié des tirages dès
line-sentence-likely = { $name } : plus d’une chance sur deux que cela ne suffise plus à partir du mois { $month } ({ $ends }) ; à la fin, c’est arrivé dans { $chance } des tirages.
line-sentence-unlikely = { $name } : sans doute suffisant, mais dans un tirage sur dix plus à partir du mois { $month } ({ $ends }) ; à la fin, c’est arrivé dans { $chance } des tirages.
line-sentence-never = { $name } : suffisant dans presque tous les tirages ; à la fin, cela a manqué dans { $chance } d’entre eux.
month-on = { $month } ({ $ends })
capacity-figure = Probabilité qu’il y ait déjà eu trop peu, selon le mois
capacity-figure-described = Une ligne pour chaque chose limitée, qui monte depuis 0 à mesure que croît la part des tirages où elle a manqué ; un trait pointillé marque la moitié.
capacity-by-month = Besoins et dépassements, mois par mois
capacity-caption = Quand cela ne suffit plus
capacity-note = Une limite compte comme dépassée dès le premier mois où le besoin est supérieur, même s’il baisse ensuite.
beds-caption = Lits occupés
beds-note = La moyenne doit rester nettement sous le nombre de lits : à son approche, les patients attendent toujours plus longtemps.
beds-when = Quand
beds-now = premier mois
beds-last = dernier mois
beds-mean = En moyenne
beds-busy = Un jour chargé (1 sur 20)
beds-utilisation = Part occupée
amount = Quantité
cost = Coût
cost-sentence = Sur { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }, avec une actualisation de { $percent } % par an, tout cela coûtera environ { $value } (95 tirages sur 100 : { $lower } à { $upper }), dans la monnaie saisie.
cost-figure = Coût par année, avec l’étendue de 80 et de 95 tirages sur 100
cost-figure-described = Pour chaque année à venir, un point au coût attendu, un trait épais pour 80 et un trait fin pour 95 tirages sur 100 ; le tableau ci-dessous contient les valeurs.
cost-caption = Coût par année, dans la monnaie saisie, sans actualisation
cost-totals-caption = Coût de toute la période, actualisé
cost-totals-note = Le coût d’une année est divisé par 1 plus le taux, une fois par année jusqu’à sa fin (Drummond et coll. 2005).
axis-year-ahead = Année après la date de clôture
discount = Actualisation par an
discount-hint = 0, 3 et 5 % sont montrés à côté.
in-percent = { $percent } %
item-caption = { $name }, par année
item-caption-unit = { $name } ({ $unit }), par année
items-example-visits = Consultations
items-example-visits-unit = visites
items-example-medicine = Médicament
items-example-medicine-unit = comprimés
items-example-beds = Hospitalisation
items-example-beds-unit = journées
lines-example-slots = Créneaux de consultation par mois
lines-example-ward = Lits du service
fault-between = De { $least } à { $greatest }.
fault-whole-between = Un nombre entier de { $least } à { $greatest }.
fault-not-above-zero = Plus que 0.
fault-item-gone = Cette ligne n’existe plus.
caution-beds_never_enough = { $name } : à partir du { $start }, plus de lits sont occupés en moyenne qu’il n’y en a. Aucune liste d’attente ne se stabilise alors.
refusal-no_items = Saisissez ce que demande un patient, ou ce dont on dispose.
refusal-line_without_item = Une limite de quantité ou de lits doit désigner une ligne de ce que demande un patient.

difference = Différence

levers-title = Les leviers côte à côte
levers-type = Saisissez un pourcentage pour un levier afin de le voir à côté de la situation actuelle.
levers-lead = Et si moins de patients étaient perdus de vue, ou trouvés plus tôt ? Chaque ligne est un levier ; les lignes de même nom agissent ensemble. Les leviers se multiplient : deux qui réduisent chacun les pertes de moitié en laissent un quart.
levers-caption = Leviers
levers-budget = Somme de comparaison
levers-budget-hint = Les scénarios sont classés selon ce que cette somme achèterait de chacun.
scenario = Scénario
lever = Levier
lever-fewer_lost = Moins de perdus de vue
lever-fewer_deaths = Moins de décès
lever-fewer_stopped = Moins d’arrêts
lever-more_completed = Plus de guérisons ou de fins de traitement
lever-fewer_newcomers = Moins de nouveaux
lever-risk_factor = Moins d’un facteur de risque
lever-found_earlier = Trouvés plus tôt
lever-percent = De %
lever-from_month = À partir du mois
lever-ramp_months = Montée en mois
lever-cost_at_start = Coût au début
lever-cost_per_year = Coût par an
lever-prevalence = Combien sont exposés
lever-relative_risk = Risque relatif
lever-among = Exposés parmi
lever-among-population = toute la population (Levin)
lever-among-patients = les patients, risque ajusté (Miettinen)
lever-months_earlier = Mois d’avance
lever-fewer_deaths_among = Décès en moins parmi eux, de
lever-more = Ligne { $row }, { $lever }
levers-example-tracing = Relance
levers-example-screening = Dépistage
levers-example-both = Les deux
levers-sentence = { $name }, après { $years ->
    [one] { $years } an
   *[other] { $years } ans
  } : { $more } suivis (95 tirages sur 100 : { $lower } à { $upper }) ; sur toute la période { $patient_years } patients-années de suivi, { $lost } perdus de vue, { $deaths } décès et { $cost } de coût actualisé.
levers-best-sentence = Pour { $budget }, « { $name } » gagne le plus de patients-années de suivi dans { $share } des tirages.
levers-figure = Patients suivis selon chaque scénario ; les bandes sont celles de la situation actuelle, pour 50, 80 et 95 tirages sur 100
levers-figure-described = Lignes sur { $years ->
    [one] { $years } an
   *[other] { $years } ans
  } pour la situation actuelle et jusqu’à quatre scénarios, distinguées par leurs tirets et nommées à leur extrémité.
levers-path-caption = Patients suivis selon chaque scénario
levers-change-caption = Ce que « { $name } » change sur { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }
levers-fraction-note = Part des nouveaux due au facteur de risque : { $fraction }.
difference-under_care = Suivis à la fin
difference-patient_years = Patients-années de suivi
difference-newcomers = Nouveaux
difference-deaths = Décès pendant le suivi
difference-lost = Perdus de vue
difference-programme = Coût du programme
difference-care = Coût des soins
difference-cost = Coût total
prices-caption = Ce qu’achète chaque scénario, classé par patients-années pour { $budget }
prices-note = Le coût est celui du programme et des soins qu’il entraîne, actualisé. Un coût négatif est une économie. Le classement suppose qu’un programme rend autant pour son argent quelle que soit sa taille.
price-per-patient-year = Coût par patient-année gagnée
price-per-death = Coût par décès évité
price-no-gain = aucun gain
price-unsure = { $value }, mais seuls { $gained } des tirages y gagnent
best-for-patient-years = Gagne le plus de patients-années (part des tirages)
best-for-deaths = Évite le plus de décès (part des tirages)
sensitivity-of = Regarder de plus près
sensitivity-figure = « { $name } » : coût par patient-année gagnée, une hypothèse changée à la fois
sensitivity-described = Une ligne par hypothèse, d’un point vide à sa borne basse à un point plein à sa borne haute, la plus large en haut ; un trait vertical marque le coût supposé.
sensitivity-caption = « { $name } » : { $value } par patient-année gagnée tel que supposé, et avec une hypothèse changée
sensitivity-note = Arrivées et taux vont à leurs limites à 95 %, les effets à la moitié et à une fois et demie, les coûts à 20 % de moins et de plus.
sensitivity-none = « { $name } » ne gagne aucune patient-année de suivi : il n’y a donc pas de coût pour chacune.
swing-what = Hypothèse
swing-low = Borne basse
swing-high = Borne haute
swing-at-low = Coût à la borne basse
swing-at-high = Coût à la borne haute
swing-newcomers = Nouveaux par an
swing-deaths = Taux de décès
swing-lost = Taux de perte de vue
swing-completed = Taux de guérison ou de fin de traitement
swing-effect = Effet des leviers
swing-unit_costs = Coûts des soins
swing-programme = Coût du programme
swing-discount = Actualisation, % par an
levers-method = Chaque pourcentage multiplie son taux ou les arrivées ; un facteur de risque agit par sa fraction attribuable (Levin 1953 ; Miettinen 1974). Chaque scénario partage les taux, les arrivées et le hasard de la situation actuelle dans chacun des { $draws } tirages (germe { $seed }), pour que le hasard ne brouille pas la différence. Qu’un programme atteigne ces pourcentages est supposé, non démontré.

break-even-title = De combien faut-il changer ?
break-even-type = Saisissez une cible pour voir quelle force un levier doit avoir.
break-even-kind = Levier
break-even-goal = Ce qui doit changer
break-even-target = Cible
goal-under_care = patients suivis à la fin
goal-lost = perdus de vue, en tout
goal-deaths = décès, en tout
goal-cost = coût actualisé, en tout
break-even-sentence = « { $lever } » de { $percent } % dès le premier mois donne { $target } ({ $goal }, jusqu’au { $ends }), si les taux sont ceux observés. Avec cela, { $share } des tirages atteignent la cible ou restent au-dessous.
break-even-never = Aucun pourcentage ne donne { $target } ({ $goal }, jusqu’au { $ends }) : « { $lever } » de 0 % donne { $none }, de { $percent } % { $most }.
break-even-caption = « { $lever } » et { $goal }
break-even-method = Le pourcentage est cherché par dichotomie jusqu’à ce que l’évolution attendue atteigne la cible ; la part des tirages vient de nouveaux tirages des taux et des effectifs à ce pourcentage.

caution-lead_time_counts = « { $name } » trouve les patients plus tôt : les mois gagnés avant leur venue comptent comme suivi, bien que personne n’en vive plus longtemps.
caution-deaths_outside_unseen = « { $name } » garde des patients qui seraient partis. Ceux qui meurent sont alors comptés ; partis, leur décès n’aurait figuré nulle part. Plus de décès pendant le suivi ne veut pas dire plus de décès.
caution-scenario_free = « { $name } » n’a pas de coût propre : rien n’a été saisi.
refusal-no_scenarios = Saisissez au moins un levier.
refusal-lever_makes_no_difference = Ce levier ne change rien à ce chiffre.
back-test-title = Aurait-elle eu raison ?
back-years = Remonter de, en années
back-test-held = Le { $origin }, la projection aurait donné { $value } patients suivis pour le { $ends } (95 tirages sur 100 : { $lower } à { $upper }). Il y en a eu { $seen } : dans la bande.
back-test-missed = Le { $origin }, la projection aurait donné { $value } patients suivis pour le { $ends } (95 tirages sur 100 : { $lower } à { $upper }). Il y en a eu { $seen } : hors de la bande. Quelque chose a changé que le passé ne montrait pas.
back-test-flows = Elle attendait { $newcomers } nouveaux, il en est venu { $seen_newcomers } ; elle attendait { $leaving } sorties, il y en a eu { $seen_leaving }.
back-test-figure = Projeté d’après ce qui était connu le { $origin } (bandes pour 50, 80 et 95 tirages sur 100), et observé (points)
back-test-described = Une ligne avec trois bandes qui s’élargissent, et une ligne pointillée avec des points pour le nombre réellement suivi ; le tableau ci-dessous contient les valeurs.
back-test-path-caption = Projeté et observé, tous les trois mois
axis-years-from-origin = Années depuis la date antérieure
projected = Projeté
projected-on = Projeté le
seen = Observé
held-p50 = Dans la bande à 50 %
held-p80 = Dans la bande à 80 %
held-p95 = Dans la bande à 95 %
back-tests-sentence = Projetée jusqu’à aujourd’hui depuis { $count } années antérieures, la bande à 95 % a tenu { $held } fois et celle à 80 % { $held80 } fois.
back-tests-caption = Suivis le { $ends }, tels qu’ils auraient été projetés à des dates antérieures
back-tests-note = Mois après mois depuis la date choisie ci-dessus, la bande à 50 % a tenu dans { $p50 } des mois, celle à 80 % dans { $p80 }, celle à 95 % dans { $p95 }. Des mois voisins partagent leur hasard.
back-test-method = Le registre tel qu’il aurait été à la date antérieure est projeté jusqu’à la clôture, de la même façon que ci-dessus. Les dates antérieures partagent leurs données : leurs succès ne sont pas indépendants.
parts-title = D’où viennent les bandes
parts-sentence = Le { $ends }, la plus grande part de la dispersion ({ $share }) vient de ceci : { $part }.
parts-figure = D’où vient la dispersion du nombre de patients suivis
parts-described = Une barre par année, partagée entre les arrivées, les sorties et le hasard.
parts-caption = Parts de la variance du nombre de patients suivis
part-inflow = combien arrivent par an
part-leaving = les taux de sortie
part-chance = le hasard entre patients
parts-method = Chaque source est retirée seule, les autres étant tenues à ce qui est attendu, et sa variance est rapportée à la somme des trois. Une histoire plus longue réduit les deux premières, jamais la troisième.
caution-back_test_hindsight = La date antérieure est vue avec un avantage : les patients aujourd’hui perdus de vue comptent comme perdus depuis leur dernière visite, ce qu’on ne savait peut-être pas encore.
caution-few_back_tests = Seules { $count } dates antérieures peuvent être essayées : le nombre de fois où les bandes ont tenu dit peu de chose.
refusal-back_test_history_too_short = Avant la date antérieure, il n’y a que { $whole_years } années complètes d’arrivées ; il en faut { $needed }. Remontez de moins d’années.
back-test-method-trend = Le registre tel qu’il aurait été à la date antérieure est projeté jusqu’à la clôture, de la même façon que ci-dessus, la tendance des arrivées étant prolongée. Les dates antérieures partagent leurs données : leurs succès ne sont pas indépendants.
scenario-file-title = Garder ce qui a été saisi
scenario-file-lead = Tout ce qui est saisi ici – années, arrivées, ce que demande un patient, limites, leviers – va dans un petit fichier. Aucun patient n’y figure. L’ouvrir plus tard, ou ailleurs avec un autre registre, ramène le tout.
scenario-file-save = Enregistrer ce qui a été saisi
scenario-file-open = Ouvrir un fichier enregistré
scenario-file-opened = Ouvert : { $levers } leviers et { $items } choses que demandent les soins.
scenario-file-strange = Ce fichier n’a pas été enregistré ici, ou une partie en est illisible. Rien n’a été changé.
caution-trend_damped = Les arrivées changent d’environ { NUMBER($percent_per_year, maximumFractionDigits: 1) } % par an ; cela est prolongé, et il en reste { NUMBER($damping, maximumFractionDigits: 2) } après chaque année suivante.
caution-register_incomplete = Le registre contiendrait { NUMBER($completeness, maximumFractionDigits: 0) } % des patients suivis : { NUMBER($count, maximumFractionDigits: 0) } patients sont ajoutés, supposés là depuis aussi longtemps que les autres.
refusal-trend_history_too_short = Le registre contient { $whole_years } années complètes d’arrivées ; il en faut { $needed } pour une tendance. Choisissez une autre voie pour les arrivées.
refusal-trend_not_found = Les arrivées annuelles n’ont pas de tendance qui puisse être prolongée. Choisissez une autre voie pour les arrivées.
caution-history_too_short = Le registre contient { $whole_years ->
    [0] aucune année complète
    [one] une année complète
   *[other] { $whole_years } années complètes
  } d’arrivées ; il en faut { $needed } pour les prolonger. Saisissez plutôt un nombre.
caution-newcomers_overdispersed = Les arrivées diffèrent d’une année à l’autre plus que le hasard ne l’explique (d’un facteur { NUMBER($dispersion, maximumFractionDigits: 1) }) ; les bandes sont élargies en conséquence.
caution-newcomers_trend = Les arrivées ont changé d’environ { NUMBER($percent_per_year, maximumFractionDigits: 0) } % par an. La projection ne prolonge pas cette tendance : choisissez « la tendance, amortie » pour le faire.
caution-years_without_newcomers = { $count ->
    [one] Une année ({ $year }), personne n’a été inscrit
   *[other] { $count } années (la première : { $year }), personne n’a été inscrit
  }. Si l’inscription s’était arrêtée, la moyenne est trop basse.
caution-old_cases_not_newcomers = { $count } patients étaient d’anciens cas à l’ouverture du registre et ne sont pas comptés comme nouveaux.
caution-no_newcomers_lately = Personne n’a été inscrit depuis le { $last }, { $days } jours avant la clôture. Si l’inscription a du retard, la dernière année est trop basse.
caution-retention_thin = Seulement { NUMBER($person_years, maximumFractionDigits: 0) } personnes-années et { $exits } sorties observées : les taux de sortie sont approximatifs.
caution-no_exits_observed = Personne n’est sorti entre { $from_years } et { $to_years } ans depuis le début. Le taux y est pris égal à 0 ; il pourrait atteindre { NUMBER($upper, maximumFractionDigits: 2) } par an.
caution-under_care_long_unseen = { $count } des patients suivis ({ $share }) ont été vus pour la dernière fois plus de { $days } jours avant la clôture. Certains sont peut-être perdus de vue : vérifiez-les, car ils gonflent la file active.
caution-horizon_beyond_history = { $years } ans d’avance dépassent les { $history_years } ans observés par le registre. Lisez la fin comme une esquisse.
caution-hazard_held = À la fin, { $share } des patients suivis auront dépassé { $from_years } ans depuis le début, où trop peu a été observé : la règle choisie pour eux est une supposition.
refusal-found_earlier_twice = Un scénario ne peut trouver les patients plus tôt qu’une seule fois.
refusal-nobody_under_care = Personne n’est suivi à la date de clôture : il n’y a personne à prolonger.
refusal-no_person_time = Personne n’a été observé ne serait-ce qu’un jour : aucun taux ne peut être calculé.
refusal-start_after_closing = La ligne { $line } commence après la date de clôture.
refusal-history_too_short = Le registre contient { $whole_years ->
    [0] aucune année complète
    [one] une année complète
   *[other] { $whole_years } années complètes
  } d’arrivées ; il en faut { $needed } pour les prolonger. Choisissez « saisis » et saisissez un nombre.

## From counts

counts-title = À partir de totaux

counts-lead = Pour qui dispose de totaux mais pas de liste. Saisissez ou collez des nombres ; il n’y a rien à ouvrir et les réponses suivent la saisie.
counts-example = Remplir avec des nombres inventés
counts-clear = Effacer
grid-cell = { $column }, ligne { $row }
grid-add = Ajouter une ligne
grid-remove = Retirer
grid-remove-row = Retirer la ligne { $row }
grid-paste-hint = Plusieurs cellules copiées d’un tableur peuvent être collées dans n’importe quelle cellule.
fault-negative = Pas en dessous de 0.
fault-not-whole = Un nombre entier.
fault-not-positive = Plus de 0.
fault-more-than-total = Plus que le total.

counts-life-table-title = Une table de survie à partir de totaux
counts-life-table-lead = Comptez les entrants puis, pour chaque intervalle, les perdus de vue, ceux sortis autrement ou encore suivis à la clôture du registre, et ceux qui ont connu l’événement.
counts-life-table-empty = Saisissez le nombre d’entrants et au moins une ligne complète.
counts-entering = Entrants au début
counts-intervals = Les intervalles, dans l’ordre
width-years = Longueur en années
withdrawn-typed = Autres sorties
counts-life-table-sentence = { $survival } ont traversé { $years } ans sans l’événement (intervalle à 95 % : { $interval }).

counts-strata-title = Deux groupes, par strates
counts-strata-lead = Pour chaque strate (tranche d’âge, stade, hôpital) : combien du groupe étudié ont connu l’événement, sur combien ; et de même pour le groupe de comparaison.
counts-strata-empty = Saisissez au moins une ligne complète.
counts-strata-grid = Les strates
stratum = Strate
typed-exposed = le groupe étudié
typed-unexposed = le groupe de comparaison
typed-exposed_events = Étudié : événements
typed-exposed_total = Étudié : patients
typed-unexposed_events = Comparaison : événements
typed-unexposed_total = Comparaison : patients
counts-strata-example-1 = Légère (inventé)
counts-strata-example-2 = Sévère (inventé)
strata-caption = Les deux groupes dans chaque strate (limites à 95 %)
risk-exposed = Risque, étudié
odds-exposed = Cote, étudié
risk-unexposed = Risque, comparaison
odds-unexposed = Cote, comparaison
risk-of = { $events } sur { $total } : { $risk }
exact-note = Rapport des cotes exact { $odds } ; p exact { $p }, mi-p { $mid }.
crude-and-pooled = Tout confondu, le rapport des risques est { $crude } ; à l’intérieur des strates, regroupé, il est { $pooled }. Si les deux diffèrent beaucoup, les strates diffèrent par plus que l’événement et le chiffre global trompe.
strata-left-out = Hors des rapports car un groupe est vide, ou personne ou tout le monde a connu l’événement : { $strata }.
strata-method = Limites du rapport des risques Katz (1978), du rapport des cotes Woolf (1955), de la différence Newcombe (1998) ; regroupement par Mantel & Haenszel (1959), variances de Robins, Breslow & Greenland (1986) et Greenland & Robins (1985) ; limites exactes conditionnelles aux marges.

counts-balance-title = Arrivées et sorties
counts-balance-lead = Combien sont suivis aujourd’hui, combien arrivent et combien sortent chaque année.
counts-balance-empty = Saisissez combien sont suivis, combien arrivent chaque année et au moins une façon de sortir.
balance-prevalent = Suivis aujourd’hui
balance-new_per_year = Nouveaux par an
balance-population = Population
balance-population-hint = Si elle est connue, pour les taux pour 100 000.
balance-years = Nombre d’années
balance-leaving = Sorties par an
balance-per-year = Patients par an
balance-example-died = Décédés (inventé)
balance-example-lost = Perdus de vue (inventé)
balance-example-moved_away = Partis ailleurs (inventé)
balance-sentence = De { $now } aujourd’hui à { $then } dans { $years } ans si le même nombre sort chaque année, ou { $rate } si c’est la même part. { $turnover } sortent pour 100 patients-années.
balance-steady = Si rien ne changeait, le nombre se stabiliserait à { $steady } ; un patient reste { $duration } ans en moyenne.
balance-population-sentence = Prévalence { $prevalence } et nouveaux cas { $incidence } par an, chacun pour 100 000 habitants.
balance-caption = Suivis dans les années à venir
after-years = Après (années)
balance-fixed = Même nombre de sorties
balance-constant = Même part de sorties
balance-method = P + t (nouveaux − sorties) pour la première, taux de sortie constant pour la seconde ; l’état stable est le nombre de nouveaux par an multiplié par la durée moyenne.

refusal-no_rows = Saisissez au moins une ligne.
refusal-uneven_rows = Les lignes ne sont pas complètes.
refusal-nobody_entered = Au moins un patient doit entrer.
refusal-width_not_positive = Ligne { $row } : la longueur de l’intervalle doit dépasser 0.
refusal-negative_count = Un nombre de patients ne peut pas être inférieur à 0.
refusal-more_left_than_entered = Ligne { $row } : { $left } sortent, mais seuls { $entering } sont présents au début.
refusal-more_events_than_patients = Plus d’événements ({ $events }) que de patients ({ $total }).
refusal-population_not_above_prevalent = La population ({ $population }) doit dépasser le nombre de patients suivis ({ $prevalent }).
caution-balance_short_horizon = La première colonne vaut pour { $limit } ans au plus : davantage de patients, c’est aussi davantage de sorties. Lisez la seconde.
caution-balance_paths_apart = À l’année { $year }, les deux colonnes diffèrent ({ $under_care } et { $at_constant_rate }) : lisez la seconde.
caution-balance_reaches_zero = Avec le même nombre de sorties chaque année, il ne resterait personne à l’année { $year }.
caution-nobody_leaves = Personne ne sort : le nombre ne fait que croître et il n’y a pas d’état stable.
caution-not_in_steady_state = { $new_per_year } arrivent et { $leaving_per_year } sortent chaque année : le nombre change, la prévalence n’est donc pas simplement l’incidence multipliée par la durée.
counts-district-title = Tout un district, par âge
counts-district-empty = Saisissez au moins un groupe d’âge : habitants, part de malades, nouveaux cas et décès.
counts-district-lead = Pour une maladie à vie et un district sans registre : à partir de ceux qui tombent malades et de ceux qui meurent, sains et malades, à chaque âge.
district-caption = Groupes d’âge
district-from_age = À partir de l’âge
district-population = Habitants
district-prevalence = Malades aujourd’hui, %
district-incidence = Nouveaux cas pour 1 000 sains par an
district-mortality_well = Décès pour 1 000 sains par an
district-mortality_ill = Décès pour 1 000 malades par an
district-last-age = Le dernier groupe finit à l’âge
district-years = Nombre d’années
district-sentence = De { $now } malades aujourd’hui, on passera à { $then } dans { $years ->
    [one] { $years } an
   *[other] { $years } ans
  }, soit { $share } des habitants.
district-steady = Si les taux avaient toujours été ceux-ci, { $steady } seraient malades : { $distance } est l’écart d’aujourd’hui. En { $years ->
    [0] zéro an
    [one] { $years } an
   *[other] { $years } ans
  }, le nombre en est à moins de 1 %.
district-steady-far = Si les taux avaient toujours été ceux-ci, { $steady } seraient malades : { $distance } est l’écart d’aujourd’hui. Même une vie entière ne comble pas l’écart.
district-figure = Part de malades par âge : aujourd’hui, dans { $years } ans et à l’équilibre
district-figure-described = Paliers par groupe d’âge, une ligne pour chacun des trois moments, distinguées par leurs tirets et nommées à leur extrémité droite.
district-now = aujourd’hui
district-then = dans { $years } ans
district-in-steady-state = équilibre
axis-age = Âge
district-groups-caption = Malades par âge
district-ages = Âges
district-ill-now = Malades aujourd’hui
district-share-now = Part aujourd’hui
district-ill-then = Malades dans { $years } ans
district-share-then = Part dans { $years } ans
district-share-steady = Part à l’équilibre
district-path-caption = Malades dans tout le district
district-ill = Malades
district-share = Part des habitants
district-method = Équation maladie-décès dp/dt = (1 − p)(i − p(m1 − m0)) le long de chaque génération, résolue exactement par demi-année (Brinks & Landwehr 2014). Personne ne guérit, n’arrive ni ne part ; chaque âge garde son nombre d’habitants.
caution-ill_die_less = À partir de { $from_age } ans, les malades mourraient moins que les sains. Vérifiez les deux taux : ils sont peut-être inversés.
caution-far_from_steady_state = Aujourd’hui se trouve à { $share } de l’équilibre de ces taux. L’incidence multipliée par la durée ne donne pas ici la part de malades, et des taux récemment changés se verront pendant des décennies.
caution-migration_ignored = Les arrivées et départs d’habitants, la guérison et les changements de taux sont laissés de côté.
refusal-no_age_groups = Saisissez au moins un groupe d’âge.
refusal-ages_not_rising = Chaque groupe d’âge doit commencer après le précédent, et le dernier finir après son début.
refusal-ages_not_whole = Les âges doivent être des années entières à partir de 0.
refusal-nobody_in_district = Il n’y a aucun habitant dans ces groupes d’âge.
caution-utilisation_at_or_above_one = { $places } places ne suffisent pas : { $needed } seraient occupées en moyenne.

refusal-utilisation_at_or_above_one = { $places } places ne suffisent pas : { $needed } seraient occupées en moyenne.

planning-title = Combien en faut-il pour le prochain bilan
planning-lead = Avant le prochain bilan : combien de patients, ou de personnes à interroger, faut-il pour une réponse utile.
planning-empty = Remplissez tous les champs ; le nombre en bas peut rester vide.
planning-question = Ce qu’il faut établir
planning-survival_size = si la survie diffère entre deux groupes
planning-proportions_size = si une proportion diffère entre deux groupes
planning-survey_size = la taille d’une proportion, en interrogeant des personnes
planning-accuracy_size = la qualité d’un test
planning-hazard_ratio = Rapport des risques à ne pas manquer
planning-survival = Sans l’événement, groupe de comparaison
planning-at_years = Après tant d’années
planning-accrual_years = Années d’arrivée des patients
planning-follow_up_years = Années de suivi après le dernier
planning-share_exposed = Dans le groupe étudié
planning-lost = Perdus avant toute information
planning-power = Puissance
planning-significance = Seuil, bilatéral
planning-available = Patients disponibles, si connu (groupe étudié)
planning-exposed = Proportion, groupe étudié
planning-reference = Proportion, groupe de comparaison
planning-reference_for_each = Comparés, pour chaque patient étudié
planning-proportion = Proportion attendue
planning-margin = À (points de pourcentage) près
planning-design_effect = Effet de plan
planning-response = Réponses attendues
planning-confidence = Confiance
planning-population = Population, si elle est petite
planning-sensitivity = Sensibilité attendue
planning-specificity = Spécificité attendue
planning-prevalence = Malades parmi les personnes testées
planning-events = Événements
planning-survival-sentence = Il faut { $events } événements pour remarquer un rapport des risques de { $ratio } avec une puissance de { $power }. Environ { $share } des patients auront eu l’événement à la clôture : il faut donc suivre { $patients } patients, y compris ceux qui seront perdus.
planning-survival-caption = Ce que demanderaient d’autres rapports et d’autres puissances
planning-power-sentence = Avec { $available } patients, la puissance est de { $power }.
planning-proportions-sentence = Il faut { $exposed } patients dans le groupe étudié et { $reference } dans l’autre pour une puissance de { $power }.
planning-proportions-caption = Patients nécessaires pour d’autres puissances
planning-survey-sentence = Interrogez { $people } personnes. ({ $answers } réponses suffiraient dans une population sans limite.)
planning-accuracy-sentence = Testez { $people } personnes : parmi elles se trouvent les { $diseased } malades pour la sensibilité ({ $sensitivity } à tester) et les { $others } non-malades pour la spécificité ({ $specificity } à tester).
planning-guess = Le résultat ne vaut que ce que valent les suppositions ci-dessus. Consultez un statisticien avant de demander à des patients de participer à quoi que ce soit.
planning-survival-method = Schoenfeld (1981, 1983) ; arrivées régulières, risques constants.
planning-proportions-method = Fleiss, Levin et Paik (2003), sans correction de continuité.
planning-survey-method = Cochran (1977), avec l’effet de plan et la population finie.
planning-accuracy-method = Buderer (1996).
fault-not-between = Entre { $least } et { $greatest }.
fault-not-from-to = De { $least } à { $greatest }.
caution-few_planned_events = Un si petit nombre ({ $events } dans la plus petite case ou en tout) dépasse ce que permet la formule.
caution-margin_wider_than_proportion = La marge est aussi large que la proportion elle-même : une telle enquête ne dirait rien.
refusal-not_a_share = { $field } : { $value } n’est pas une proportion entre 0 et 1.
refusal-nothing_to_notice = Les deux groupes sont supposés identiques : il n’y a rien à remarquer.
refusal-no_follow_up_planned = Sans arrivées ni suivi, rien ne peut être observé.

## Report

report-title = Rapport

report-lead = Tout ce qui a été montré dans les autres rubriques figure ci-dessous, dans l’ordre de sa première apparition. Écartez ce qui est inutile, puis imprimez ou gardez en un seul fichier.
report-empty = Rien n’a encore été montré. Ouvrez un registre ou saisissez des totaux, regardez les réponses, puis revenez.
report-field-title = Titre
report-field-hospital = Hôpital ou programme
report-field-author = Préparé par
report-field-date = Date
report-date-hint = Telle qu’elle doit être imprimée ; cette page n’utilise jamais l’horloge de l’ordinateur.
report-pieces = Dans le rapport
report-print = Imprimer
report-save = Enregistrer en un fichier HTML
report-untitled = Rapport de suivi
report-no-byline = Hôpital, auteur et date non renseignés
report-made-with = Calculé sur un seul ordinateur avec Vitalroll { $version } ; aucun dossier ne l’a quitté.
figure-number = Figure { $number }. { $title }
table-number = Tableau { $number }. { $title }
about-data = Les patients
about-data-sentence = { $n } patients dont le suivi a commencé entre le { $first } et le { $last }, suivis jusqu’à la date de clôture du { $closing } : { $years } personnes-années au total.
about-file = Fichier
about-fingerprint = Empreinte du fichier (SHA-256)
about-rows = Lignes du fichier
flow-caption = Des lignes du fichier à la fin du suivi
flow-stage = Étape
flow-rows = Lignes du fichier
flow-set-aside = Écartées
flow-analysed = Analysées
flow-changed = Analysées après modification
share = Part
