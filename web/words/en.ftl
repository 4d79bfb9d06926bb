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

outcomes-title = What became of the patients
outcomes-lead = Choose which endings count as the outcome, and if you like a column to compare groups by. Everything below follows.

axis-years-since-start = Years since start
row-atRisk = At risk
row-events = Events
row-censored = Censored
group = Group
years-since-start = Years since start
standard-error = Standard error
lost = Lost
events-so-far = Outcomes so far
censored-so-far = Censored so far
beyond-follow-up = beyond follow-up
count-share = { $count } ({ $share })
from-to = { $lower } to { $upper }
sentence-group = { $group }: {""}
levels-left-out = Left out because nobody is in them: { $levels }.

survival-title = Survival over time
survival-sentence-deaths = { $group }{ $survival } were alive { $years ->
    [one] { $years } year
   *[other] { $years } years
  } after starting (95 % interval { $interval }), judging from { $n } patients and { $events } deaths.
survival-sentence-other = { $group }{ $survival } were free of the chosen outcome { $years ->
    [one] { $years } year
   *[other] { $years } years
  } after starting (95 % interval { $interval }), judging from { $n } patients and { $events } outcomes.
survival-sentence-short = { $group }follow-up of these { $n } patients is shorter than one year; read the curve as far as it goes.
median-reached = Half had met it by { $median } years.
median-not-reached = Fewer than half had met it by the end of follow-up, so there is no median.
survival-figure-deaths = Share still alive, by years since start
survival-figure-other = Share still free of the outcome, by years since start
survival-figure-described = { $curves ->
    [one] A falling step curve with its 95 % band; the numbers at risk stand below it, and the table behind the figure holds every value.
   *[other] { $curves } falling step curves with their 95 % bands; the numbers at risk stand below them, and the table behind the figure holds every value.
  }
survival-counts-caption = At risk, outcomes and censored at each year
survival-at-years-caption = Survival at chosen times, with 95 % limits
survival-heading-deaths = Alive
survival-heading-other = Free of the outcome
losses-caption = What those lost to follow-up could change
losses-note = The truth lies between the two columns. The curve above takes those lost to be like those who stayed; if that is doubtful, quote both columns.
if-all-lost-died = If all lost had met the outcome at last contact
if-none-lost-died = If none had, up to the closing date
no-losses = Nobody was lost to follow-up, so losses change nothing here.
interval-kind = Kind of confidence interval
interval-log-log = log-log (usual choice)
interval-log = log
interval-plain = plain
survival-method = Product limit (Kaplan & Meier 1958), Greenwood's variance (1926), { $interval } limits; where the curve has not moved from 100 % or has reached 0 %, beta-product limits (Fay and others 2013). Outcomes come before censorings on the same day. The median is the first time the curve is at or below 50 % (Brookmeyer & Crowley 1982). Drawn while at least 10 are at risk; short strokes mark patients censored.

life-table-title = Life table
life-table-caption = Actuarial life table
life-table-caption-group = Actuarial life table: { $group }
life-table-step = Length of the intervals
step-year = Years
step-quarter = Quarters
step-month = Months
interval-years = Years
interval-months = Months
interval-from-to = { $from } to { $to }
entering = Entering
withdrawn = Otherwise withdrawn
events = Outcomes
effective = Effective number
chance = Chance in interval
odds = Odds in interval
survival-to-end = Survival to end (95 % limits)
hazard-per-year = Hazard per year
life-table-method = Actuarial method (Berkson & Gage 1950; Cutler & Ederer 1958): those lost or withdrawn in an interval count for half of it. Greenwood's standard error; hazard at the middle of the interval (Gehan 1969).

leaving-title = Every way of leaving
leaving-sentence = { $group }after { $years ->
    [one] { $years } year
   *[other] { $years } years
  }, { $stayed } were still under care; the commonest way of leaving was “{ $way }”, with { $share }.
leaving-sentence-nobody = { $group }nobody has left yet.
leaving-figure = Where the patients are, by years since start: { $group }
leaving-figure-described = A stacked area: those still under care at the bottom, above them { $ways ->
    [one] one way of leaving
   *[other] { $ways } ways of leaving
  }, together always 100 %. The table below holds the values.
leaving-caption = Cumulative incidence of each way of leaving: { $group }
leaving-note = The last column shows what one minus survival would wrongly say, as if the other ways of leaving did not exist. Do not quote it.
way-of-leaving = Way of leaving
events-in-all = In all
cumulative-incidence = Cumulative incidence (95 % limits)
one-minus-survival = One minus survival (too high)
leaving-method = Aalen & Johansen (1978), all ways of leaving at once; variance as in Marubini & Valsecchi (1995).

## Compare

compare-title = Compare

## Caseload

caseload-title = Caseload

## From counts

counts-title = From counts

## Report

report-title = Report
