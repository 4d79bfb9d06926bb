### Français.

## The frame

page-title = { $place } – Vitalroll
job = Du registre de suivi aux réponses : ce que sont devenus les patients, quel groupe s’en est mieux sorti, combien seront suivis demain.
skip-to-content = Aller au contenu
places-label = Rubriques
language = Langue
undo = Annuler
licences = Licences des logiciels inclus
engine-version = Vitalroll { $version }
always-cautions = Décrit des groupes ; ne sert pas à décider pour un patient. Les recommandations locales et l’exercice autorisé de la médecine priment. Une association n’est pas une cause.

place-register = Registre
place-outcomes = Devenir
place-compare = Comparer
place-caseload = File active
place-counts = À partir de totaux
place-report = Rapport

## The engine's start and the seal

engine-stage-waiting = Préparation…
engine-stage-fetching = Chargement du moteur : { $done } sur { $total }
engine-stage-unpacking = Décompression du moteur…
engine-stage-runtime = Démarrage du moteur…
engine-stage-libraries = Chargement des bibliothèques numériques…
engine-stage-desk = Ouverture du guichet…
not-yet-sealed = Pas encore scellée. Un registre pourra être ouvert une fois la page scellée.
sealed = Scellée : cette page ne peut plus joindre aucun réseau.
seal-broken = Non scellée : ce navigateur laisse encore la page joindre un réseau. N’ouvrez pas de registre ici ; utilisez un navigateur récent.
sealed-meaning = Tout le nécessaire a été chargé. Le navigateur refuse désormais toute requête de cette page : ce que vous ouvrez ici ne peut pas quitter cet ordinateur. Recharger la page recommence de zéro, rien n’est conservé.
sealed-tried = Pour s’en assurer, la page a tenté { $tried } requêtes inoffensives vers sa propre adresse après le scellement ; le navigateur en a refusé { $refused }.
sealed-check-yourself = Pour le vérifier vous-même : coupez le réseau maintenant ; tout continue de fonctionner. Ou ouvrez les outils de développement du navigateur, liste des requêtes, et constatez que rien ne s’ajoute.
engine-revived-out_of_memory = Le moteur a manqué de mémoire et a été relancé. Votre fichier et vos choix sont de retour ; la dernière question est restée sans réponse.
engine-revived-internal = Le moteur s’est arrêté de façon inattendue et a été relancé. Votre fichier et vos choix sont de retour.
engine-revived-stopped = Arrêté. Votre fichier et vos choix sont de retour.
start-again = Recommencer
engine-failure-network = Le moteur n’a pas pu être chargé. Vérifiez la connexion vers l’endroit d’où vient cette page, puis recommencez.
engine-failure-integrity = Une partie du moteur est arrivée abîmée ou modifiée et n’a pas été utilisée. Recommencez ; si cela se répète, prévenez la personne qui héberge cette page.
engine-failure-too_old = Ce navigateur est trop ancien pour le moteur. Utilisez une version récente de Firefox, Chrome, Edge ou Safari.
engine-failure-framed = Cette page est affichée dans une autre page et n’y ouvrira aucun registre. Ouvrez-la dans son propre onglet.
engine-failure-internal = Le moteur n’a pas pu démarrer. Recommencez ; si cela se répète, essayez un autre navigateur récent.
megabytes = { $size } Mo

## Words that every place uses

estimate = { $value } ({ $lower } à { $upper })
everyone = Ensemble
working = Calcul en cours…
stop = Arrêter
save-table = Enregistrer ce tableau en CSV
save-figure = Enregistrer cette figure en SVG
figure-data = Les nombres derrière cette figure
cautions-label = Précautions
no-register-yet = Ouvrez d’abord un registre, dans la rubrique Registre ; ou passez par « À partir de totaux » si vous n’avez que des totaux.
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

question-interest = Quelles issues sont l’événement étudié ?
question-interest-hint = Toute autre issue met seulement fin à l’observation.
question-group = Par groupe
question-no-group = Sans groupes : tout le monde ensemble

## Refusals that any place can meet

refusal-internal = Le calcul n’a pas abouti à cause d’une erreur du programme. Rien de ce que vous avez saisi n’est perdu.
refusal-worker_died = Le moteur s’est arrêté deux fois sur cette question. Demandez moins à la fois, par exemple moins de groupes ou un fichier plus petit.
refusal-out_of_memory = La mémoire n’a pas suffi. Fermez d’autres onglets ou ouvrez un fichier plus petit.
refusal-stopped = Arrêté avant la fin.
refusal-no_register = Ouvrez d’abord un registre.
refusal-unknown_field = La demande comporte un élément inconnu : { $field }.
refusal-missing_field = Il manque encore : { $field }.
refusal-wrong_type = { $field } n’est pas du bon type.
refusal-not_one_of = { $field } ne fait pas partie des choix possibles.
refusal-out_of_range = { $field } doit être compris entre { $least } et { $greatest }.
refusal-unknown_task = Le moteur ne sait pas faire cela.
refusal-unknown_meaning = { $meaning } ne fait pas partie des issues connues.
refusal-unknown_covariate = La colonne { $covariate } ne fait pas partie du registre tel qu’il a été lu.
refusal-group_is_numeric = { $covariate } est un nombre. Choisissez une colonne à quelques catégories pour former des groupes.
refusal-no_outcome_of_interest = Choisissez au moins une issue comme événement étudié.
refusal-under_care_is_not_an_outcome = Être encore suivi n’est pas une issue : choisissez une fin de suivi.
refusal-uneven_cohort = Les colonnes du registre n’ont pas la même longueur.
refusal-negative_time = Ligne { $line } : temps antérieur au début du suivi.
refusal-exit_before_entry = Ligne { $line } : le suivi se termine avant d’avoir commencé.

## Register

register-title = Registre

## Outcomes

## Compare

compare-title = Comparer

## Caseload

caseload-title = File active

## From counts

counts-title = À partir de totaux

## Report

report-title = Rapport
