//! What the command says of itself: its checks, completions for shells, a page of manual, a schema for editors.

use std::io::Write as _;

use clap_complete::Shell;

use super::{ADEQUATE, FAILED, command};
use crate::checks::catalogue::ALL;

/// Prints every check with its clause.
pub fn checks() -> u8 {
    let mut out = anstream::stdout().lock();
    let mut on = "";
    for known in ALL {
        if known.on != on {
            let gap = if on.is_empty() { "" } else { "\n" };
            let _ = writeln!(out, "{gap}{}", known.on);
            on = known.on;
        }
        let _ = writeln!(out, "  {}  [{}]", known.words, known.clause);
    }
    let _ = writeln!(
        out,
        "\nClauses without a standard are of BS EN 1996-1-1 with its UK National Annex. Every sheet prints formula, values\n\
         and source; what a clause does not cover is an outcome of its own."
    );
    ADEQUATE
}

/// Prints the completions of a shell.
pub fn completions(shell: Shell) -> u8 {
    let mut bytes = Vec::new();
    clap_complete::generate(shell, &mut command(), "perpend", &mut bytes);
    written(&bytes)
}

/// Prints the manual in the format of `man`.
pub fn manual() -> u8 {
    let mut bytes = Vec::new();
    match page(&mut bytes) {
        Ok(()) => written(&bytes),
        Err(_) => FAILED,
    }
}

/// Prints the JSON Schema of a job file.
pub fn schema() -> u8 {
    match serde_json::to_string_pretty(&crate::job::schema()) {
        Ok(text) => written(format!("{text}\n").as_bytes()),
        Err(_) => FAILED,
    }
}

/// The page of the command, and below it one for each of its subcommands.
fn page(out: &mut Vec<u8>) -> std::io::Result<()> {
    let whole = command();
    let main = clap_mangen::Man::new(whole.clone()).date("");
    main.render(out)?;
    for sub in whole.get_subcommands().filter(|s| !s.is_hide_set()) {
        let name = format!("perpend {}", sub.get_name());
        let one = clap_mangen::Man::new(sub.clone().bin_name(name));
        writeln!(out, ".SH {}", sub.get_name().to_uppercase())?;
        one.render_synopsis_section(out)?;
        one.render_description_section(out)?;
        one.render_options_section(out)?;
    }
    Ok(())
}

fn written(bytes: &[u8]) -> u8 {
    let mut out = std::io::stdout().lock();
    if out.write_all(bytes).and_then(|()| out.flush()).is_ok() { ADEQUATE } else { FAILED }
}
