;;; settlewell.el --- Channel sheets checked as you type  -*- lexical-binding: t -*-

;; For eglot, which Emacs 29 brings along and older ones take from their packages.
;;
;;   (load "/where/it/is/settlewell.el")
;;
;; Then open a NAME.channels.yaml.  `settlewell-command' says how the server is started.

;;; Code:

(require 'eglot)

(defgroup settlewell nil
  "Checks of channel sheets."
  :group 'tools)

(defcustom settlewell-command '("settlewell" "serve")
  "The server's program and its arguments."
  :type '(repeat string))

(define-derived-mode settlewell-mode prog-mode "Channels"
  "Major mode for channel sheets, a kind of YAML."
  (setq-local comment-start "# ")
  (setq-local comment-start-skip "#+ *")
  (setq-local indent-tabs-mode nil)
  (setq-local indent-line-function #'indent-relative)
  (setq-local font-lock-defaults
              '((("\\(?:^\\| \\)\\(#.*\\)$" 1 font-lock-comment-face t)
                 ("\\([a-z0-9-]+\\):\\(?: \\|$\\)" 1 font-lock-keyword-face)))))

(add-to-list 'auto-mode-alist '("\\.channels\\.yaml\\'" . settlewell-mode))
(add-to-list 'eglot-server-programs
             '(settlewell-mode . (lambda (&rest _) settlewell-command)))
(add-hook 'settlewell-mode-hook #'eglot-ensure)

(provide 'settlewell)
;;; settlewell.el ends here
