//! The language of the checks. Each macro takes the sheet first; formulas name local variables only.

/// The symbols of a formula with their values: `[("f_b", …), …]`.
#[doc(hidden)]
#[macro_export]
macro_rules! symbols {
    (@ [$($acc:tt)*]) => { [$($acc)*] };
    (@ [$($acc:tt)*] $f:ident ( $($in:tt)* ) $($rest:tt)*) => {
        $crate::symbols!(@ [$($acc)*] $($in)* $($rest)*)
    };
    (@ [$($acc:tt)*] ( $($in:tt)* ) $($rest:tt)*) => {
        $crate::symbols!(@ [$($acc)*] $($in)* $($rest)*)
    };
    (@ [$($acc:tt)*] $i:ident $($rest:tt)*) => {
        $crate::symbols!(@ [$($acc)* (stringify!($i), $crate::trace::Traced::traced(&$i)),] $($rest)*)
    };
    (@ [$($acc:tt)*] $x:tt $($rest:tt)*) => { $crate::symbols!(@ [$($acc)*] $($rest)*) };
    ($($f:tt)+) => { $crate::symbols!(@ [] $($f)+) };
}

/// `given!(s, "words", "where from", l = value)`: an input; without `= value` for what is bound already.
#[macro_export]
macro_rules! given {
    ($s:expr, $words:expr, $source:expr, $name:ident) => {
        if $s.recording() {
            $s.given(stringify!($name), $words, $source, $crate::trace::Traced::traced(&$name));
        }
    };
    ($s:expr, $words:expr, $source:expr, $name:ident = $value:expr) => {
        let $name = $value;
        if $s.recording() {
            $s.given(stringify!($name), $words, $source, $crate::trace::Traced::traced(&$name));
        }
    };
}

/// `lookup!(s, "clause", "words", f_xk1 = looked)`: a table value with the rows it came from.
#[macro_export]
macro_rules! lookup {
    ($s:expr, $clause:expr, $words:expr, $name:ident = $looked:expr, $unit:expr) => {
        let $name = {
            let looked = $looked;
            let value = $unit * looked.value;
            if $s.recording() {
                $s.lookup(
                    stringify!($name),
                    $words,
                    $clause,
                    $crate::trace::Traced::traced(&value),
                    looked.rows,
                    looked.source.to_string(),
                );
            }
            value
        };
    };
}

/// `found!(s, "clause", "words", x_n = value)`: the result of a search, which a later step verifies.
#[macro_export]
macro_rules! found {
    ($s:expr, $clause:expr, $words:expr, $name:ident = $value:expr) => {
        let $name = $value;
        if $s.recording() {
            $s.found(stringify!($name), $words, $clause, $crate::trace::Traced::traced(&$name));
        }
    };
}

/// `calc!(s, "clause", "words", name = formula)`: computes, binds `name` and records the step.
#[macro_export]
macro_rules! calc {
    ($s:expr, $clause:expr, $words:literal, $name:ident = $($f:tt)+) => {
        let $name = $($f)+;
        if $s.recording() {
            $s.step(
                stringify!($name),
                $words,
                $clause,
                stringify!($($f)+),
                $crate::trace::Traced::traced(&$name),
                &$crate::symbols!($($f)+),
            );
        }
    };
    ($s:expr, $clause:expr, $name:ident = $($f:tt)+) => { $crate::calc!($s, $clause, "", $name = $($f)+) };
}

/// `decide!(s, "clause", "if so", "if not", a <= b)`: a branch that shows; yields whether it holds.
#[macro_export]
macro_rules! decide {
    ($s:expr, $clause:expr, $yes:expr, $no:expr, $($rel:tt)+) => {{
        let holds = $($rel)+;
        if $s.recording() {
            let words = if holds { $yes } else { $no };
            $s.decide(words, $clause, stringify!($($rel)+), holds, &$crate::symbols!($($rel)+));
        }
        holds
    }};
}

/// `require!(s, "id", "clause", "limit in words", a <= b)`: a limit of application. Outside it the
/// enclosing function returns `Err(Outside)`.
#[macro_export]
macro_rules! require {
    ($s:expr, $id:expr, $clause:expr, $words:expr, $($rel:tt)+) => {{
        let holds = $($rel)+;
        if $s.recording() {
            $s.require($words, $clause, stringify!($($rel)+), holds, &$crate::symbols!($($rel)+));
        }
        if !holds {
            return Err($crate::trace::Outside::new($id, $clause, $words));
        }
    }};
}

/// `verify!(s, "id", "clause", "words", V_Ed <= V_Rd)`: demand against resistance. Both sides are
/// symbols that stand on the sheet. Yields the use ratio.
#[macro_export]
macro_rules! verify {
    ($s:expr, $id:expr, $clause:expr, $words:expr, $demand:ident <= $resistance:ident) => {{
        let holds = $demand <= $resistance;
        $s.verify(
            $id,
            $words,
            $clause,
            (stringify!($demand), $crate::trace::Traced::traced(&$demand)),
            (stringify!($resistance), $crate::trace::Traced::traced(&$resistance)),
            holds,
        )
    }};
}
