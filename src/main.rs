//! The `perpend` command.

fn main() -> std::process::ExitCode {
    std::process::ExitCode::from(perpend::cli::run())
}
