### English. One key set for all languages; the tests compare them.

## The frame

page-title = { $place } – Vitalroll
job = From a follow-up register to answers: what became of the patients, which group did better, and how many will be under care.
skip-to-content = Skip to the content
places-label = Places
language = Language
undo = Undo
licences = Licences of the software inside
engine-version = Vitalroll { $version }
always-cautions = Describes groups; not for decisions about one patient. Local guidelines and licensed practice prevail. Association is not cause.

place-register = Register
place-outcomes = Outcomes
place-compare = Compare
place-caseload = Caseload
place-counts = From counts
place-report = Report

## The engine's start and the seal

engine-stage-waiting = Getting ready…
engine-stage-fetching = Fetching the engine: { $done } of { $total }
engine-stage-unpacking = Unpacking the engine…
engine-stage-runtime = Starting the engine…
engine-stage-libraries = Loading the numerical libraries…
engine-stage-desk = Opening the desk…
not-yet-sealed = Not sealed yet. A register can be opened once the page is sealed.
sealed = Sealed: this page can no longer reach any network.
seal-broken = Not sealed: this browser still lets the page reach a network. Do not open a register here; use a current browser.
sealed-meaning = Everything needed has been fetched. The browser now refuses every request from this page, so what you open here cannot leave this computer. Reloading the page begins again, with nothing kept.
sealed-tried = To make sure, the page tried { $tried } harmless requests to its own address after sealing; the browser refused { $refused }.
sealed-check-yourself = To check it yourself: disconnect the network now; everything goes on working. Or open the browser's developer tools at the network list and watch that nothing is added.
engine-revived-out_of_memory = The engine ran out of memory and was started again. Your file and your choices are back; the last question was not answered.
engine-revived-internal = The engine stopped unexpectedly and was started again. Your file and your choices are back.
engine-revived-stopped = Stopped. Your file and your choices are back.
start-again = Start again
engine-failure-network = The engine could not be fetched. Check the connection to where this page came from, then start again.
engine-failure-integrity = A part of the engine arrived damaged or changed, so it was not used. Start again; if this repeats, tell whoever hosts this page.
engine-failure-too_old = This browser is too old for the engine. Use a current Firefox, Chrome, Edge or Safari.
engine-failure-framed = This page is shown inside another page and will not open registers there. Open it in a tab of its own.
engine-failure-internal = The engine could not be started. Start again; if this repeats, try another current browser.
megabytes = { $size } MB

## Words that every place uses

estimate = { $value } ({ $lower } to { $upper })
everyone = Everyone
working = Working…
stop = Stop
save-table = Save this table as CSV
save-figure = Save this figure as SVG
figure-data = The numbers behind this figure
cautions-label = Cautions
no-register-yet = Open a register first, in the place Register; or use From counts if you have only totals.
choose = Choose…
none = None
years-count = { $years ->
    [one] { $years } year
   *[other] { $years } years
}

meaning-under_care = under care
meaning-died_of_disease = died of the disease
meaning-died_of_other_cause = died of another cause
meaning-died_cause_unknown = died, cause unknown
meaning-recovered = recovered or completed treatment
meaning-moved_away = moved away (transferred)
meaning-lost = lost to follow-up
meaning-stopped = stopped by choice

covariate-sex = Sex
covariate-age = Age at start
covariate-age_band = Age group at start
covariate-start_year = Year of start
covariate-start_period = Period of start
sex-female = Female
sex-male = Male
sex-other = Other

question-interest = Which endings count as the outcome?
question-interest-hint = Every other ending only ends observation.
question-group = By group
question-no-group = No groups: everyone together

## Refusals that any place can meet

refusal-internal = This could not be worked out because of a fault in the program. Nothing you entered was lost.
refusal-worker_died = The engine stopped while working on this, twice. Ask for less at once, for example fewer groups or a smaller file.
refusal-out_of_memory = There was not enough memory for this. Close other tabs, or open a smaller file.
refusal-stopped = Stopped before it was finished.
refusal-no_register = Open a register first.
refusal-unknown_field = The request had a part that is not known: { $field }.
refusal-missing_field = Something is still missing: { $field }.
refusal-wrong_type = { $field } is not of the right kind.
refusal-not_one_of = { $field } is not one of the possible choices.
refusal-out_of_range = { $field } must be from { $least } to { $greatest }.
refusal-unknown_task = The engine does not know how to do this.
refusal-unknown_meaning = { $meaning } is not one of the known endings.
refusal-unknown_covariate = The column { $covariate } is not part of the register as it was read.
refusal-group_is_numeric = { $covariate } is a number. Choose a column with a few categories to group by.
refusal-no_outcome_of_interest = Choose at least one ending that counts as the outcome.
refusal-under_care_is_not_an_outcome = Being under care is not an outcome: choose an ending.
refusal-uneven_cohort = The columns of the register do not have the same length.
refusal-negative_time = Line { $line }: time before the start of follow-up.
refusal-exit_before_entry = Line { $line }: follow-up ends before it begins.

## Register

register-title = Register

## Outcomes

## Compare

compare-title = Compare

## Caseload

caseload-title = Caseload

## From counts

counts-title = From counts

## Report

report-title = Report
